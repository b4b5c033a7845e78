/** Ai and Ai' at the multiples of 1/2 from -8.5 to 8.5, from 40-digit arithmetic. */
const centres: readonly (readonly [number, number])[] = [
  [-0.33029023763020887, -0.03231334828463914],
  [-0.0527050503563862, 0.9355609381983065],
  [0.3217757163806479, 0.3188095066985546],
  [0.18428083525050565, -0.7710081684101265],
  [-0.2380203019971158, -0.6749524925132022],
  [-0.3291451736298231, 0.3459354872813429],
  [0.017781541276574976, 0.8641972177713984],
  [0.35076100902411433, 0.32719281855444315],
  [0.2921527810559595, -0.5233625323157477],
  [-0.07026553294928951, -0.7906285753685813],
  [-0.37553382314043193, -0.34344343345404815],
  [-0.37881429367765806, 0.3145837692165988],
  [-0.11232506769296609, 0.6788527342647943],
  [0.22740742820168558, 0.618259020741691],
  [0.4642565777488694, 0.3091869672024104],
  [0.5355608832923521, -0.01016056711664521],
  [0.4757280916105396, -0.20408167033954738],
  [0.3550280538878172, -0.2588194037928068],
  [0.23169360648083348, -0.2249105326646839],
  [0.13529241631288141, -0.1591474412967932],
  [0.07174949700810541, -0.09738201284230132],
  [0.03492413042327438, -0.05309038443365363],
  [0.01572592338047049, -0.026250881035903232],
  [0.006591139357460719, -0.011912976705951319],
  [0.002584098786989635, -0.005004413967952583],
  [0.0009515638512048018, -0.001958640950204179],
  [0.00033025032351430896, -0.0007178665675575089],
  [0.00010834442813607442, -0.0002474138908684625],
  [3.368531190859981e-5, -8.046339130556515e-5],
  [9.947694360252889e-6, -2.4765200397034955e-5],
  [2.7958823432049136e-6, -7.231931466601793e-6],
  [7.492128863997167e-7, -2.008150894738792e-6],
  [1.9172560675134309e-7, -5.312713959720545e-7],
  [4.6922076160992316e-8, -1.3414392979067865e-7],
  [1.0997009755195506e-8, -3.237725440447602e-8],
];
const firstCentre = -8.5;
const spacing = 0.5;
const localOrder = 24;

/** Taylor coefficients of a solution of w'' = z w about z from its value and slope there. */
function coefficientsAbout(z: number, value: number, slope: number, order: number): number[] {
  const out = [value, slope];
  for (let k = 0; k + 2 <= order; k++) {
    out.push((z * out[k] + (k === 0 ? 0 : out[k - 1])) / ((k + 1) * (k + 2)));
  }
  return out.slice(0, order + 1);
}

/**
 * Taylor coefficients of the Airy function Ai about a point.
 *
 * Value and slope come from the series about the nearest of 35 tabulated points, at most 1/4 away.
 *
 * @param z from -8.75 to 8.75
 * @param order highest degree
 * @returns Ai^(k)(z)/k! for k = 0..order
 * @throws RangeError outside the table
 * @example airyTaylor(0, 0)[0] // 0.3550280538878172
 * @see NIST Digital Library of Mathematical Functions, sections 9.2 and 9.4 (from memory)
 */
export function airyTaylor(z: number, order: number): number[] {
  const index = Math.round((z - firstCentre) / spacing);
  const known = centres[index];
  if (!known) throw new RangeError(`the Airy function is tabulated from -8.75 to 8.75, not at ${z}`);
  const centre = firstCentre + index * spacing;
  const local = coefficientsAbout(centre, known[0], known[1], localOrder);
  const step = z - centre;
  let value = 0;
  let slope = 0;
  for (let k = localOrder; k >= 0; k--) {
    slope = slope * step + value;
    value = value * step + local[k];
  }
  return coefficientsAbout(z, value, slope, order);
}
