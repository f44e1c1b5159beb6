/** What a massing file may hold at most; the same for the browser, the API and the checks. */
export const massingLimits = {
  fileBytes: 25 * 1024 * 1024,
  vertices: 20_000,
  features: 5_000,
  topM: 1000,
} as const;
