/**
 * What can hurt someone, as captions, notes and worksheets name it. The order is the one in which gathered
 * cautions of one moment are told.
 */
export const CAUTION_TOPICS = [
  'zinc',
  'fumes',
  'arc',
  'rotating',
  'grinding',
  'pressure',
  'lifting',
  'load',
  'stored',
  'pinch',
  'fire',
  'electric',
  'dust',
  'paint',
  'eyes',
  'hearing',
  'chemicals',
  'solvents',
  'food',
] as const;
export type CautionTopic = (typeof CAUTION_TOPICS)[number];

/** Whether a stored topic is one of ours. */
export function isCautionTopic(topic: string | null): topic is CautionTopic {
  return (CAUTION_TOPICS as readonly (string | null)[]).includes(topic);
}
