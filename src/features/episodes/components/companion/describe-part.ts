import { type CompanionPart } from '../../companion.ts';

const KINDS = { made: 'made', bought: 'bought', salvaged: 'salvaged' } as const;

/** A part in half a line, without its size: "2 needed, made · bright bar". */
export function describePart({ quantity, kind, material, inPlans }: CompanionPart): string {
  const words = [`${String(quantity)} needed, ${KINDS[kind]}`, material, inPlans ? '' : 'not in the plans'];
  return words.filter((word) => word !== '').join(' · ');
}
