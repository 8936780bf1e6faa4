import type { SeedContext } from '../context';
import { seedGearboxCell } from './gearbox-cell';
import { seedPumpLine } from './pump-line';

/** The demo's projects, made by the same functions as users' own. Run again, it adds what is missing and changes nothing. */
export async function seedProjects(context: SeedContext): Promise<void> {
  await seedPumpLine(context);
  await seedGearboxCell(context);
}
