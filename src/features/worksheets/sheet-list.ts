/** The worksheets that anyone may fill in, as the list of them says it. */
export const OPEN_SHEETS = {
  lengths: {
    title: 'Lengths',
    about: 'mm, inches, fractions, thou and feet, and the nearest mark of a rule.',
  },
  holes: { title: 'Holes', about: 'Tapping and clearance drills, and holes for split pins.' },
  fits: {
    title: 'Limits and fits',
    about: 'Shaft and hole by ISO 286, the clearance, and what is still to come off.',
  },
  seats: { title: 'Bearing seats', about: 'The seats of a bearing, by which ring turns under the load.' },
  sections: { title: 'Section mass', about: 'What a bar, tube or angle weighs by the metre.' },
  ports: {
    title: 'Ports',
    about: 'Which thread a port has, how it seals, and what it must never be mated with.',
  },
  drive: { title: 'Drives and speeds', about: 'Pulleys, belts, gears, and the speed for cutting.' },
  square: {
    title: 'Square and angle',
    about: 'An angle from offset and length, and a frame by its diagonals.',
  },
} as const;
export type OpenSheetId = keyof typeof OPEN_SHEETS;
