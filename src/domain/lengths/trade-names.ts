/**
 * Numbers in running text that are names or something else than a length. They are never converted; where one of
 * them and a size overlap, the longer stands. The forms are the trade's own: ISO 261 and ISO 965 threads,
 * ASME B1.1 (UNC, UNF), ISO 228 and ISO 7 (G, R), ASME B1.20.1 (NPT), AWS A5.1 electrodes, ISO 286 fits.
 */
const FRACTION = String.raw`(?:\d{1,2}[- ])?\d{1,2}[/⁄]\d{1,2}`;
const INCH_SIZE = String.raw`(?:${FRACTION}|\d{1,2}(?:\.\d+)?)`;

export const TRADE_NAMES: readonly RegExp[] = [
  // M12, M12x1.75, M12 x 1.25
  /(?<![\p{L}\p{N}])M\d{1,3}(?:\.\d)?(?:[ ]?[x×][ ]?[0-6](?:\.\d{1,2})?(?![\d.]|[ ]?[a-z]))?/gu,
  // 3/8-16, 1/4-20 UNC, 1 1/4-7, #10-32, 10-24 UNC
  new RegExp(String.raw`(?<![\p{L}\p{N}/.-])${FRACTION}-\d{1,2}(?![\d/])(?:[ ]UN[A-Z]*)?`, 'gu'),
  /(?<![\p{L}\p{N}])(?:#\d{1,2}-\d{2}|\d{1,2}-\d{2}(?=[ ]UN))(?:[ ]UN[A-Z]*)?/gu,
  // 3/8 NPT, 1/2" BSP, 1 in NPT, 1/2-13 UNC
  new RegExp(
    String.raw`(?<![\p{L}\p{N}/.-])${INCH_SIZE}(?:["″]|[ ]in(?:ch)?\.?)?[ -]?(?:NPT[FR]?|NPSM?|BSP[PT]?|UN[CFJ]?[F]?|UNEF|JIC|ORB|ORFS|ACME|Acme|tpi|TPI)(?![\p{L}\p{N}])`,
    'gu',
  ),
  // G 3/8, R 1/2, Rc 1/4, JIC 6
  new RegExp(
    String.raw`(?<![\p{L}\p{N}])(?:G|R[cps]?|JIC|ORB|SAE|DN|NPS)[ -]?(?:${FRACTION}|\d{1,2})["″]?(?![\d.])`,
    'gu',
  ),
  // E7018, 6013, ER70S-6
  /(?<![\p{L}\p{N}])(?:E\d{4,5}(?:-\d)?|ER\d{2,3}[A-Z]-\d|60(?:10|11|12|13)|70(?:14|16|18|24))(?![\p{L}\p{N}])(?:,?[ ]\d\.\d{1,2}[ ]?mm(?!\p{L}))?/gu,
  // 16 ga, 16 gauge, 14 SWG
  /(?<![\p{L}\p{N}.])\d{1,2}[ -]?(?:ga|gauge|SWG|swg|AWG|awg|MSG)(?![\p{L}\p{N}])/gu,
  // 35 k6, 25 H7/k6, 35 mm k6
  /(?<![\p{L}\p{N}.])\d{1,4}(?:\.\d+)?(?:[ ]mm)?[ ]?(?:[A-HJ-KM-NP-Z]|JS|js|[a-hj-km-np-wyz])(?:0?1|[2-9]|1[0-8])(?:\/(?:js|[a-zA-Z])\d{1,2})?(?![\p{L}\p{N}])/gu,
  // 6207, 6207-2RS, UCP 207
  /(?<![\p{L}\p{N}])(?:(?:bearing|UC[PFT]?)[ ]?)?(?:6[0-4]\d{2}|22[23]\d{2}|3[02]\d{3})(?:-?(?:2RS|2Z|ZZ|RS|C3))?(?![\p{L}\p{N}])/giu,
  // No. 7 drill, #7, letter F drill
  /(?<![\p{L}\p{N}])(?:No\.?[ ]?|#)\d{1,2}(?:[ ]drill)?(?![\d-])/giu,
  // 14:22, 3:41, 1:10, 2:1, 14:22:07
  /(?<![\p{L}\p{N}])\d+(?::\d+)+(?:\.\d+)?/gu,
  // 2026-11-12, 12/11/2026, 12 Nov 2026, Nov 12
  /(?<![\p{L}\p{N}])(?:\d{4}-\d{2}-\d{2}|\d{1,2}\/\d{1,2}\/\d{2,4}|\d{1,2}[ ](?:Jan|Feb|Mar|Apr|May|Jun|Jul|Aug|Sep|Oct|Nov|Dec)[a-z]*(?:[ ]\d{4})?)/gu,
  // $20, € 4.50
  /[$€£¥][ ]?\d[\d.,]*/gu,
  // v1.2.3, 2.1.0
  /(?<![\p{L}\p{N}])(?:v\d+(?:\.\d+)*|\d+(?:\.\d+){2,})/giu,
  // 1920x1080, 3840 × 2160, 1080p: a size has its unit behind it and is longer
  /(?<![\p{L}\p{N}])(?:\d{3,4}[ ]?[x×][ ]?\d{3,4}|\d{3,4}p)(?![\p{L}\p{N}])/gu,
  // 2 needed
  /(?<![\p{L}\p{N}])\d+[ ](?:needed|off|pcs|pieces)(?![\p{L}\p{N}])/gu,
];

const MAKE = String.raw`(?:bright|black|mild|steel|stainless|alloy|alumini?um|brass|copper|cast|silver|tool|spring|cold|hot|rolled|drawn|solid|square|round|flat|hollow|hex|hexagon|galvani[sz]ed|welded|seamless|hydraulic|threaded|ball|roller|thick|wall|drill)`;
const STOCK = String.raw`(?:bars?|flats?|plates?|sheets?|angles?|channels?|tub(?:es?|ing)|pipes?|hoses?|box|SHS|RHS|rounds?|rods?|electrodes?|wire|stock|studding|bolts?|screws?|nuts?|washers?|bearings?|chain|belts?|ply(?:wood)?|stainless|timbers?|boards?|cable|rope|drills?|drill bits?|taps?|reamers?|E?(?:60(?:10|11|13)|70(?:14|16|18|24))s?)`;

/** After a size: what makes it the name of a stock size, as in 40 mm bright bar or 3.2 mm rods. */
export const STOCK_AFTER = new RegExp(
  String.raw`[ -](?:${MAKE}[ -]){0,3}${STOCK}(?![\p{L}\p{N}])(?![ ](?:on|in|at|the|off|of the)\b)`,
  'iuy',
);
