/** Metres in a US survey foot, by its definition (1 m = 39.37 in exactly). */
const metresPerSurveyFoot = 1200 / 3937;

export const toSurveyFeet = (metres: number): number => metres / metresPerSurveyFoot;

/**
 * NAD83 / Wisconsin North in US survey feet (EPSG:2287), the state plane zone in which the invented city
 * would lie, as the text of a .prj file. The parameters were compared with the EPSG register's.
 */
export const stateplaneWkt =
  'PROJCS["NAD_1983_StatePlane_Wisconsin_North_FIPS_4801_Feet",' +
  'GEOGCS["GCS_North_American_1983",DATUM["D_North_American_1983",' +
  'SPHEROID["GRS_1980",6378137.0,298.257222101]],PRIMEM["Greenwich",0.0],' +
  'UNIT["Degree",0.0174532925199433]],PROJECTION["Lambert_Conformal_Conic"],' +
  'PARAMETER["False_Easting",1968500.0],PARAMETER["False_Northing",0.0],' +
  'PARAMETER["Central_Meridian",-90.0],PARAMETER["Standard_Parallel_1",45.56666666666667],' +
  'PARAMETER["Standard_Parallel_2",46.76666666666667],' +
  'PARAMETER["Latitude_Of_Origin",45.16666666666666],UNIT["Foot_US",0.3048006096012192]]';
