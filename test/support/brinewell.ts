/** The settings of an invented municipality, as its first administrator sends them. */
export const brinewell = {
  name: 'Town of Brinewell',
  shortName: 'Brinewell',
  timeZone: 'America/Chicago',
  locale: 'en-US',
  longitude: -92.1,
  latitude: 45.2,
  elevationM: 210,
  extent: [-92.2, 45.1, -92, 45.3],
  studyYear: 2026,
};
