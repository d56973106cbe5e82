import { DEFAULT_RESAMPLES, MAX_RESAMPLES } from '@/lib/inversion/index';

export const HELP = `Fits a carrier profile to an energy scan.

  npm run --silent invert -- --scan F --stopping F [F…] [options]

Files
  --scan F                  energy, value and σ per line; text with or without a header
  --stopping F [F…]         one matrix file, or one file per energy with the energy in its name
  --depth-unit nm|A|um      unit of the stopping depths (default: what the heading says, else nm)
  --energy-unit keV|eV      unit of the scan energies (default: what the heading says, else keV)

Model
  --observable fraction|rate
                            what the scan measures (default: what goes with the response, else fraction)
  --response two-level|capture-rate
                            default: two-level for a fraction, capture-rate for a rate
  --profile sharp|graded    default: graded
  --polarity depletion|accumulation
                            few or many carriers below the surface (default: depletion)
  --gamma VALUE             capture coefficient in cm³/s; needed for capture-rate
  --baseline VALUE          capture rate without carriers in 1/µs (default: 0)
  --bulk-concentration VALUE
                            in cm⁻³; turns the populated share of a fraction into a concentration
  --cap-thickness VALUE     cap layer in front of the semiconductor in nm (default: 0)
  --depth-scale held|free   held at 1, or free with the prior 1.00 ± 0.03 (default: held)

Bands
  --resamples N             0 to ${MAX_RESAMPLES}; 0 gives no bands (default: ${DEFAULT_RESAMPLES})
  --seed N                  whole number from 0 (default: 1); the same seed gives the same bands

Output
  --json                    one JSON object instead of a table
  --help                    this text

Exit code: 0 fitted, 2 bad input (the reason is on stderr), 3 no usable minimum.
A fitted profile is a model-dependent estimate, valid only within its reach.
`;
