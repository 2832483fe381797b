declare module 'psychrolib' {
  interface Psychrolib {
    SI: number
    SetUnitSystem: (system: number) => void
    /** Air in °C, relative humidity from 0 to 1, in SI; answers in °C. */
    GetTDewPointFromRelHum: (temperature: number, relativeHumidity: number) => number
  }
  const psychrolib: Psychrolib
  export = psychrolib
}
