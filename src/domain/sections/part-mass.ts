import { runWorksheet } from '../worksheets/worksheet.ts';
import { sectionsWorksheet } from './sections-worksheet.ts';

/** A part as a parts list has it. */
export interface ListedPart {
  readonly number: string;
  readonly name: string;
  readonly quantity: number;
  readonly material: string;
  readonly size: string;
}

/** What a part weighs, all its pieces together; or why that is not known. */
export interface PartMass extends Pick<ListedPart, 'number' | 'name' | 'quantity'> {
  readonly kg: number | null;
  /** How the material and size were read; of what is not known, why. */
  readonly read: string;
}

/** What the sections of a list weigh together, as far as they could be read. */
export interface BuildMass {
  readonly kg: number;
  readonly parts: readonly PartMass[];
}

const NUMBER = String.raw`(\d+(?:\.\d+)?)`;
const BY = String.raw`\s*[x×]\s*`;
const SECTION = (numbers: number, words: string) =>
  new RegExp(`^${Array.from({ length: numbers }, () => NUMBER).join(BY)}(?:\\s*mm)?\\s+(?:${words})\\b`, 'i');

/** How a material is written, and the input of the worksheet that it is. */
const SECTIONS = [
  { pattern: SECTION(3, 'box|rhs|shs|hollow'), input: 'rhs' },
  { pattern: SECTION(3, 'angle'), input: 'angle' },
  { pattern: SECTION(2, 'shs'), input: 'shs' },
  { pattern: SECTION(2, 'angle'), input: 'angle' },
  { pattern: SECTION(2, 'flat'), input: 'flat' },
  { pattern: SECTION(2, 'tube|pipe'), input: 'pipe' },
  { pattern: SECTION(1, '(?:bright |round )*bar|round'), input: 'round' },
] as const;
const PLATE = new RegExp(`^${NUMBER}(?:\\s*mm)?\\s+(?:stainless\\s+)?(?:plate|sheet|stainless)`, 'i');
const LENGTH = new RegExp(`^${NUMBER}(?:\\s*mm)?(?:\\s+long)?$`, 'i');
const FACE = new RegExp(`^${NUMBER}${BY}${NUMBER}(?:\\s*mm)?$`, 'i');

/** Austenitic stainless, 1.4301: EN 10088-1, annex E. From memory. */
const STAINLESS = '7900 kg/m3';
/** What is not steel, or not one section, is not weighed by these. */
const OTHER = /\b(?:alumin(?:i)?um|brass|bronze|copper|ash|oak|maple|pine|ply\w*|wood|back to back)\b/i;

function inputsOf({ material, size, quantity }: ListedPart): Readonly<Record<string, string>> | string {
  if (OTHER.test(material)) return 'not one section of steel';
  const density = /stainless/i.test(material) ? { density: STAINLESS } : {};
  const pieces = String(quantity);
  const [, thickness] = PLATE.exec(material.trim()) ?? [];
  if (thickness !== undefined) {
    const [, width, length] = FACE.exec(size.trim()) ?? [];
    if (width === undefined || length === undefined) return 'the size is no width by length';
    return { flat: `${width}x${thickness}`, length, quantity: pieces, ...density };
  }
  for (const { pattern, input } of SECTIONS) {
    const found = pattern.exec(material.trim());
    if (found === null) continue;
    const [, length] = LENGTH.exec(size.trim()) ?? [];
    if (length === undefined) return 'the size is no length';
    return { [input]: found.slice(1).join('x'), length, quantity: pieces, ...density };
  }
  return 'the material is no section that is read here';
}

function weigh(part: ListedPart): PartMass {
  const { number, name, quantity } = part;
  const inputs = inputsOf(part);
  if (typeof inputs === 'string') return { number, name, quantity, kg: null, read: inputs };
  const worked = runWorksheet(sectionsWorksheet, inputs);
  if (!worked.ok) return { number, name, quantity, kg: null, read: worked.error };
  return { number, name, quantity, kg: worked.value.result.kg, read: `${part.material}, ${part.size}` };
}

/**
 * What the sections of a parts list weigh: bars, tubes, angles and plates whose material and size are written plainly.
 * What cannot be read is listed with why, and is not in the sum.
 */
export function massOfParts(list: readonly ListedPart[]): BuildMass {
  const parts = list.map(weigh);
  return { kg: parts.reduce((sum, { kg }) => sum + (kg ?? 0), 0), parts };
}
