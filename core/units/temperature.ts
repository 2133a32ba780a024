/** Temperature in degrees Celsius. */
export type Celsius = number & { readonly unit: 'celsius' };

/** Thermodynamic temperature in kelvin. */
export type Kelvin = number & { readonly unit: 'kelvin' };

/** Marks a plain number as degrees Celsius; the caller vouches for the unit. */
export function celsius(value: number): Celsius {
  return value as Celsius;
}

/** Degrees Celsius to kelvin; exact by definition of the Celsius scale. */
export function toKelvin(temperature: Celsius): Kelvin {
  return (temperature + 273.15) as Kelvin;
}
