import { type RuleData } from '../rule/rule-data.ts';

/** An episode with something of everything on its rule. */
export const SAMPLE_RULE: RuleData = {
  length: 848,
  now: 220,
  balloons: [
    { id: 'a', at: 58, label: '117', name: 'drum shaft' },
    { id: 'b', at: 130, label: '119', name: 'ball bearing' },
    { id: 'c', at: 220, label: '118', name: 'bearing housing', filled: true },
    { id: 'd', at: 306, label: '120', name: 'drum' },
    { id: 'e', at: 391, label: '104', name: 'gusset' },
    { id: 'f', at: 554, label: '124', name: 'cylinder' },
    { id: 'g', at: 558, label: '125', name: 'port adapter' },
    { id: 'h', at: 562, label: '127.2', name: 'seal washer', dashed: true },
    { id: 'i', at: 680, label: '106', name: 'platen' },
    { id: 'j', at: 760, label: '131', name: 'drip tray', href: '#rule' },
  ],
  pops: [
    { id: '1', at: 58, kind: 'step', label: 'Face and centre the drum shaft', href: '#note-58' },
    { id: '2', at: 130, kind: 'size', label: 'Bearing seats came out at 35.009 mm', href: '#note-130' },
    {
      id: '3',
      at: 220,
      kind: 'step',
      label: 'Bearing housings go on through slotted feet',
      href: '#note-220',
    },
    { id: '4', at: 306, kind: 'caution', label: 'Guard the drum before it turns', href: '#note-306' },
    { id: '5', at: 391, kind: 'setting', label: 'Gussets: E7018, 3.2 mm rods, 115 A', href: '#note-391' },
    { id: '6', at: 430, kind: 'tip', label: 'Tack opposite corners first', href: '#note-391' },
    { id: '7', at: 470, kind: 'rating', label: 'The stand carries 120 kg', href: '#note-391' },
    { id: '8', at: 554, kind: 'change', label: 'G 3/8 ports, not 3/8 NPT', href: '#note-554' },
    { id: '9', at: 560, kind: 'undecided', label: 'Washer or thread sealant', href: '#note-554' },
    { id: '10', at: 610, kind: 'ask', label: 'Has anyone run this on one line?', href: '#note-554' },
    { id: '11', at: 680, kind: 'correction', label: 'Platen travel is 160 mm', href: '#note-680' },
    { id: '12', at: 760, kind: 'step', label: 'Drip tray on its rails', href: '#note-680' },
  ],
  chapters: [
    { at: 0, label: 'Drum shaft' },
    { at: 180, label: 'Bearing housings' },
    { at: 365, label: 'Gussets' },
    { at: 535, label: 'Cylinder and ports', href: '#rule' },
    { at: 720, label: 'Drip tray' },
  ],
  hatchings: [
    { from: 146, to: 162, label: 'second seat turned' },
    { from: 322, to: 338, label: 'second housing welded' },
    { from: 494, to: 510, label: 'gussets painted' },
  ],
};

/** Two hours, to see the rule thin itself. */
export const LONG_RULE: RuleData = {
  length: 7260,
  balloons: Array.from({ length: 26 }, (_, index) => ({
    id: `l${String(index)}`,
    at: 400 + index * 90,
    label: String(101 + index),
  })),
  pops: Array.from({ length: 40 }, (_, index) => ({
    id: `p${String(index)}`,
    at: 300 + index * 70,
    kind: 'step' as const,
    label: `Note ${String(index + 1)}`,
    href: '#rule',
  })),
  chapters: [
    { at: 0, label: 'A two-hour stream' },
    { at: 3600, label: 'The second hour' },
  ],
};
