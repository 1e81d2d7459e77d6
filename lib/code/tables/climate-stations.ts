/**
 * Design temperatures of United States stations.
 * Source: ASHRAE Handbook 2009 design conditions in the headers of published TMY3 weather files.
 * °C. Defaults only: the designer enters the value in force at the site.
 */

export interface ClimateStation {
  readonly wmo: string;
  readonly station: string;
  readonly state: string;
  readonly latitude: number;
  readonly longitude: number;
  readonly elevationM: number;
  /** Extreme annual mean minimum design dry bulb. */
  readonly minC: number;
  /** Annual 2 % cooling design dry bulb. */
  readonly high2pctC: number;
}

export const CLIMATE_STATIONS: readonly ClimateStation[] = [
  { wmo: "723445", station: "Fayetteville Drake Field", state: "AR", latitude: 36, longitude: -94.17, elevationM: 381, minC: -17.2, high2pctC: 32.4 },
  { wmo: "722780", station: "Phoenix Sky Harbor Intl Ap", state: "AZ", latitude: 33.45, longitude: -111.98, elevationM: 337, minC: 1.3, high2pctC: 41.2 },
  { wmo: "724940", station: "San Francisco Intl Ap", state: "CA", latitude: 37.62, longitude: -122.4, elevationM: 2, minC: 1.8, high2pctC: 23.6 },
  { wmo: "724660", station: "Colorado Springs Muni Ap", state: "CO", latitude: 38.82, longitude: -104.72, elevationM: 1872, minC: -22.6, high2pctC: 29.4 },
  { wmo: "724666", station: "Denver Centennial Golden Nr", state: "CO", latitude: 39.74, longitude: -105.18, elevationM: 1829, minC: -22.9, high2pctC: 30.2 },
  { wmo: "725650", station: "Denver Intl Ap", state: "CO", latitude: 39.83, longitude: -104.65, elevationM: 1650, minC: -22.7, high2pctC: 31.8 },
  { wmo: "724089", station: "Wilmington New Castle Cnty Ap", state: "DE", latitude: 39.67, longitude: -75.6, elevationM: 23, minC: -15.3, high2pctC: 30.4 },
  { wmo: "747880", station: "Macdill Afb", state: "FL", latitude: 27.85, longitude: -82.52, elevationM: 8, minC: 0.8, high2pctC: 32.6 },
  { wmo: "722020", station: "Miami Intl Ap", state: "FL", latitude: 25.82, longitude: -80.3, elevationM: 11, minC: 5.1, high2pctC: 32.1 },
  { wmo: "722190", station: "Atlanta Hartsfield Intl Ap", state: "GA", latitude: 33.63, longitude: -84.43, elevationM: 308, minC: -11.2, high2pctC: 31.9 },
  { wmo: "911820", station: "Honolulu Intl Arpt", state: "HI", latitude: 21.32, longitude: -157.93, elevationM: 2, minC: 14.2, high2pctC: 31.2 },
  { wmo: "725450", station: "Cedar Rapids Municipal Ap", state: "IA", latitude: 41.88, longitude: -91.72, elevationM: 256, minC: -26.3, high2pctC: 29.9 },
  { wmo: "725300", station: "Chicago Ohare Intl Ap", state: "IL", latitude: 41.98, longitude: -87.92, elevationM: 201, minC: -23.7, high2pctC: 30.1 },
  { wmo: "724386", station: "Lafayette Purdue Univ Ap", state: "IN", latitude: 40.42, longitude: -86.93, elevationM: 183, minC: -22.8, high2pctC: 30.9 },
  { wmo: "725090", station: "Boston Logan IntL Arpt", state: "MA", latitude: 42.37, longitude: -71.02, elevationM: 6, minC: -16.5, high2pctC: 29.1 },
  { wmo: "724060", station: "Baltimore Blt Washngtn IntL", state: "MD", latitude: 39.17, longitude: -76.68, elevationM: 45, minC: -14.9, high2pctC: 31.4 },
  { wmo: "727450", station: "Duluth International Arpt", state: "MN", latitude: 46.83, longitude: -92.22, elevationM: 433, minC: -32.1, high2pctC: 25.7 },
  { wmo: "727720", station: "Helena Regional Airport", state: "MT", latitude: 46.6, longitude: -111.97, elevationM: 1167, minC: -29.8, high2pctC: 29.9 },
  { wmo: "723140", station: "Charlotte Douglas Intl Arpt", state: "NC", latitude: 35.22, longitude: -80.95, elevationM: 222, minC: -11.1, high2pctC: 31.9 },
  { wmo: "745966", station: "Cape May Co", state: "NJ", latitude: 39, longitude: -74.92, elevationM: 7, minC: -12.7, high2pctC: 28.8 },
  { wmo: "723860", station: "Las Vegas Mccarran Intl Ap", state: "NV", latitude: 36.08, longitude: -115.15, elevationM: 648, minC: -3.8, high2pctC: 39.8 },
  { wmo: "725280", station: "Buffalo Niagara Intl Ap", state: "NY", latitude: 42.93, longitude: -78.73, elevationM: 215, minC: -19.5, high2pctC: 27.6 },
  { wmo: "723544", station: "Oklahoma City Wiley", state: "OK", latitude: 35.53, longitude: -97.65, elevationM: 396, minC: -14.7, high2pctC: 34.6 },
  { wmo: "726980", station: "Portland International Ap", state: "OR", latitude: 45.6, longitude: -122.62, elevationM: 6, minC: -6.4, high2pctC: 28.6 },
  { wmo: "722540", station: "Austin Mueller Municipal Ap U", state: "TX", latitude: 30.29, longitude: -97.74, elevationM: 213, minC: -7.1, high2pctC: 35.5 },
  { wmo: "722544", station: "Camp Mabry", state: "TX", latitude: 30.32, longitude: -97.77, elevationM: 198, minC: -5.4, high2pctC: 35.3 },
  { wmo: "722590", station: "Dallas Fort Worth Intl Ap", state: "TX", latitude: 32.9, longitude: -97.02, elevationM: 171, minC: -9.1, high2pctC: 35.7 },
  { wmo: "722430", station: "Houston Bush Intercontinental", state: "TX", latitude: 30, longitude: -95.37, elevationM: 29, minC: -4.4, high2pctC: 34 },
];
