/** Raised whenever the same input can give other figures. */
export const engineVersion = '1.1.0';
