import {
  gravityAt,
  seaWaterDensity,
  vapourPressure,
  waterDensity,
  waterViscosity,
} from '../calc/water/water-properties'
import { worked, type Given, type MethodSection } from './formula'
import { symbol } from './symbols'

const tex = String.raw

const t = symbol('t', 'Temperature of the water', '°C', '0 to 40 °C')
const TEMPERATURE = { t: ['t', 10, '°C'] } as const satisfies Record<string, Given>

/** Properties of water and of the place. */
export const WATER: MethodSection = {
  id: 'water',
  title: 'Water and gravity',
  intro: ['The program takes 1000 kg/m³ and 9.81 m/s² unless other values are entered.'],
  formulas: [
    {
      id: 'density',
      title: 'Density of fresh water',
      tex: [
        tex`\rho = 999.974\,95\left[1 - \frac{(t - 3.983\,035)^2\,(t + 301.797)}{522\,528.9\,(t + 69.348\,81)}\right]`,
      ],
      symbols: [symbol(tex`\rho`, 'Density', 'kg/m³'), t],
      assumptions: ['Atmospheric pressure, no salt.'],
      source: 'CIPM 2001, Tanaka et al., Metrologia 38, formula as quoted in public code',
      tag: 'memory',
      worked: worked(TEMPERATURE, (x) => [[tex`\rho`, waterDensity(x.t), 'kg/m³']]),
    },
    {
      id: 'viscosity',
      title: 'Viscosity',
      tex: [
        tex`\mu = 280.68\,\tau^{-1.9} + 511.45\,\tau^{-7.7} + 61.131\,\tau^{-19.6} + 0.459\,03\,\tau^{-40}\ \text{in } \mu\mathrm{Pa\,s}, \qquad \tau = \frac{t + 273.15}{300}`,
        tex`\nu = \mu / \rho`,
      ],
      symbols: [
        symbol(tex`\mu`, 'Dynamic viscosity', 'Pa·s'),
        symbol(tex`\nu`, 'Kinematic viscosity', 'm²/s'),
        t,
      ],
      assumptions: ['Liquid water at 0.1 MPa.'],
      source: 'IAPWS, supplementary release on liquid water at 0.1 MPa (from memory)',
      tag: 'memory',
      worked: worked(TEMPERATURE, (x) => [
        [tex`\mu`, waterViscosity(x.t), 'Pa·s'],
        [tex`\nu`, waterViscosity(x.t) / waterDensity(x.t), 'm²/s'],
      ]),
    },
    {
      id: 'vapour',
      title: 'Vapour pressure',
      tex: [
        tex`p_v = \left[\frac{2C}{-B + \sqrt{B^2 - 4AC}}\right]^4\ \text{MPa}, \qquad \vartheta = T + \frac{n_9}{T - n_{10}}`,
        tex`A = \vartheta^2 + n_1\vartheta + n_2, \quad B = n_3\vartheta^2 + n_4\vartheta + n_5, \quad C = n_6\vartheta^2 + n_7\vartheta + n_8`,
      ],
      symbols: [
        symbol('T', 'Temperature in kelvin', 'K', '0 to 100 °C'),
        symbol(tex`n_1 \ldots n_{10}`, 'Coefficients of table 34', '–'),
      ],
      assumptions: ['Over liquid water.'],
      source: 'IAPWS-IF97, eq. 30 (from memory)',
      tag: 'memory',
      worked: worked(TEMPERATURE, (x) => [['p_v', vapourPressure(x.t), 'Pa']]),
    },
    {
      id: 'sea-water',
      title: 'Density of sea water',
      tex: [
        tex`\rho = \rho_0(t) + A(t)\,S + B(t)\,S^{3/2} + 4.8314\times10^{-4}\,S^2`,
        tex`\rho_0 = 999.842\,594 + 6.793\,952\times10^{-2}t - 9.095\,29\times10^{-3}t^2 + 1.001\,685\times10^{-4}t^3`,
        tex`\qquad - 1.120\,083\times10^{-6}t^4 + 6.536\,332\times10^{-9}t^5`,
        tex`A = 0.824\,493 - 4.0899\times10^{-3}t + 7.6438\times10^{-5}t^2 - 8.2467\times10^{-7}t^3 + 5.3875\times10^{-9}t^4`,
        tex`B = -5.724\,66\times10^{-3} + 1.0227\times10^{-4}t - 1.6546\times10^{-6}t^2`,
      ],
      symbols: [
        symbol('S', 'Practical salinity', '–', '0 to 42'),
        symbol('t', 'Temperature of the water', '°C', '−2 to 40 °C'),
      ],
      assumptions: ['At the surface, one atmosphere.'],
      source: 'EOS-80, UNESCO 1981 (from memory)',
      tag: 'memory',
      worked: worked({ t: ['t', 5, '°C'], S: ['S', 35, '–'] }, (x) => [
        [tex`\rho`, seaWaterDensity(x.t, x.S), 'kg/m³'],
      ]),
    },
    {
      id: 'gravity',
      title: 'Gravity by latitude',
      tex: [
        tex`g = 9.780\,325\,335\,9\;\frac{1 + 0.001\,931\,852\,652\,41\,\sin^2\phi}{\sqrt{1 - 0.006\,694\,379\,990\,14\,\sin^2\phi}}`,
      ],
      symbols: [symbol(tex`\phi`, 'Latitude', '°', '−90 to 90 °')],
      assumptions: ['At sea level.'],
      source: 'WGS 84, formula of Somigliana (from memory)',
      tag: 'memory',
      worked: worked({ phi: [tex`\phi`, 45, '°'] }, (x) => [['g', gravityAt(x.phi), 'm/s²']]),
    },
  ],
}
