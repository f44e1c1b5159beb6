/** Where and by which clock a rule is judged. */
export interface Place {
  longitude: number;
  latitude: number;
  /** IANA name. */
  timezone: string;
  /** Metres above sea level. */
  elevation: number;
}
