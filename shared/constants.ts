/** Acceleration of gravity used unless the case says otherwise [m/s²]. Rounded standard value; printed on the sheet. */
export const GRAVITY = 9.81

/** Density of fresh water used unless the case says otherwise [kg/m³]. */
export const WATER_DENSITY = 1000

/** Standard atmosphere at sea level [Pa]. ISO 2533:1975. */
export const STANDARD_ATMOSPHERE = 101_325

/** 0 °C on the thermodynamic scale [K]. SI Brochure, 9th edition. */
export const CELSIUS_ZERO = 273.15

/** Density of air for wind pressure [kg/m³]. EN 1991-1-4, 4.5(1), note 2: recommended value. */
export const WIND_AIR_DENSITY = 1.25

/** Force coefficient of a rough cylinder lying on the ground [–]. Common practice, after the form of EN 1991-1-4, 7.9. */
export const WIND_FORCE_COEFFICIENT = 1.2

/** Water or waves lower than this are not there [m]: a few atoms, and the edge of what doubles carry. */
export const FILM = 1e-9
