import { type Dialect } from '../finding.ts';
import { type Claim, type Shop } from './claim.ts';
import { type Measure } from './measures.ts';

/** How the maker measures: as told, else the units most of the sizes are in. */
export function readShop(measures: readonly Measure[], named: readonly Claim[], dialect: Dialect): Shop {
  const mil = dialect.mil ?? 'mm';
  if (dialect.units !== undefined) return { units: dialect.units, mil };
  let metric = 0;
  let inch = 0;
  for (const { terms } of measures)
    for (const { unit, form } of terms) {
      if (unit === 'mm' || unit === 'cm' || unit === 'm') metric++;
      // Thou are spoken in metric shops too.
      else if (unit === 'in' || unit === 'ft') inch++;
      else if (unit === null && form === 'fraction') inch += 0.25;
      else if (unit === 'bar' || unit === 'Nm' || unit === 'C') metric += 0.5;
      else if (unit === 'psi' || unit === 'ft-lb' || unit === 'F') inch += 0.5;
    }
  for (const { values } of named) if (/^M/.test(String(values[0]?.value))) metric += 0.5;
  return { units: inch > metric ? 'in' : 'mm', mil };
}
