import { type CautionTopic } from './topics.ts';

/** A published text that says more than a line can. */
export interface CautionSource {
  readonly publisher: string;
  readonly title: string;
  readonly number: string;
}

/** The usual caution of a topic, in our own words. */
export interface UsualCaution {
  /** What it is about, for a heading or a label. */
  readonly label: string;
  readonly words: string;
  readonly sources: readonly CautionSource[];
}

function osha(section: string, title: string): CautionSource {
  return {
    publisher: 'US Occupational Safety and Health Administration',
    title,
    number: `29 CFR ${section}`,
  };
}

function hse(number: string, title: string): CautionSource {
  return { publisher: 'UK Health and Safety Executive', title, number };
}

const WELDING: CautionSource = {
  publisher: 'American Welding Society',
  title: 'Safety in Welding, Cutting, and Allied Processes',
  number: 'ANSI Z49.1',
};
const HOT_WORK = osha('1910.252', 'Welding, cutting and brazing: general requirements');
const MACHINES = osha('1910.212', 'General requirements for all machines');
const LOCKOUT = osha('1910.147', 'The control of hazardous energy (lockout/tagout)');

/** Numbers and titles of the sources are from memory, not looked up: a page names them without quoting. */
export const USUAL_CAUTIONS: Readonly<Record<CautionTopic, UsualCaution>> = {
  zinc: {
    label: 'zinc fumes',
    words:
      'Take the zinc off well back from the joint before you weld or braze, and draw the smoke away from your face. Breathing it brings on fever and chills.',
    sources: [HOT_WORK, WELDING],
  },
  fumes: {
    label: 'fumes',
    words:
      'Work where the air moves, keep your head out of the smoke, and draw it off at the joint. In a tank or a closed room that is not enough: get trained help.',
    sources: [hse('HSG258', 'Controlling airborne contaminants at work'), HOT_WORK],
  },
  arc: {
    label: 'arc light',
    words:
      'Wear a helmet with the shade for your current and cover your skin. Screen the arc, so that nobody who passes looks into it.',
    sources: [WELDING, osha('1910.133', 'Eye and face protection')],
  },
  rotating: {
    label: 'rotating parts',
    words:
      'Fit the guard before it turns under power. Stop it, lock it out and wait until it stands still before you reach in or clear a jam. No gloves, loose sleeves, rings or long hair near it.',
    sources: [MACHINES, LOCKOUT],
  },
  grinding: {
    label: 'grinding',
    words:
      'Use a wheel rated for the speed, with its guard on, and look it over before you start it. Stand out of its plane while it runs up. Wear a face shield over glasses.',
    sources: [
      osha('1910.215', 'Abrasive wheel machinery'),
      hse('HSG17', 'Safety in the use of abrasive wheels'),
    ],
  },
  pressure: {
    label: 'hydraulic pressure',
    words:
      'Let the pressure off before you open a line, and never feel for a leak by hand: a jet goes through skin and needs a surgeon at once. Set the relief valve below the weakest part, and have someone qualified check the system.',
    sources: [
      {
        publisher: 'International Organization for Standardization',
        title:
          'Hydraulic fluid power: general rules and safety requirements for systems and their components',
        number: 'ISO 4413',
      },
    ],
  },
  lifting: {
    label: 'lifting',
    words:
      'Know what it weighs and what your slings and hoist are rated for. Nobody stands under or beside the load. Lower it onto blocks before you work on it.',
    sources: [osha('1910.184', 'Slings'), hse('L113', 'Safe use of lifting equipment')],
  },
  load: {
    label: 'things under load',
    words:
      'Stay out of line with anything that is loaded: it can slip, tip or fly. Block what a jack or a ram holds up. Whether a frame carries its load is for a licensed person to say.',
    sources: [osha('1910.244', 'Other portable tools and equipment (jacks)')],
  },
  stored: {
    label: 'stored energy',
    words:
      'Springs, raised weights, charged capacitors and trapped oil keep their force when the power is off. Let it out or block it, and lock the supply, before you take anything apart.',
    sources: [LOCKOUT],
  },
  pinch: {
    label: 'pinch points',
    words:
      'Keep hands out of anything that closes. Set the controls so that both hands are needed, or so that nobody reaches the gap, and try it first with a piece of wood.',
    sources: [
      {
        publisher: 'International Organization for Standardization',
        title: 'Safety of machinery: minimum gaps to avoid crushing of parts of the human body',
        number: 'ISO 13854',
      },
      MACHINES,
    ],
  },
  fire: {
    label: 'fire',
    words:
      'Clear away what burns, cover what you cannot move, and have an extinguisher within reach. Sparks travel: look round again well after the last one. Local rules may ask for a permit.',
    sources: [
      {
        publisher: 'US National Fire Protection Association',
        title: 'Standard for Fire Prevention During Welding, Cutting, and Other Hot Work',
        number: 'NFPA 51B',
      },
      HOT_WORK,
    ],
  },
  electric: {
    label: 'electricity',
    words:
      'Switch off, lock off and prove dead before you touch a conductor. Wiring is under your local code, and in many places only a licensed electrician may do it.',
    sources: [
      osha('1910.333', 'Selection and use of work practices'),
      hse('HSG85', 'Electricity at work: safe working practices'),
    ],
  },
  dust: {
    label: 'dust',
    words:
      'Catch dust where it is made, and wear a mask that is rated for it and fits. If it may hold asbestos, stop: that is work for a licensed firm.',
    sources: [
      osha('1910.134', 'Respiratory protection'),
      hse('HSG258', 'Controlling airborne contaminants at work'),
    ],
  },
  paint: {
    label: 'old paint',
    words:
      'Take old paint for leaded until a test says otherwise. Do not burn, weld or dry-grind it; strip it wet, and keep the waste apart as your local rules say.',
    sources: [hse('L132', 'Control of lead at work'), osha('1926.62', 'Lead')],
  },
  eyes: {
    label: 'eyes',
    words:
      'Wear glasses with side shields for any cutting, chipping, drilling or wire brushing, and so does whoever stands by.',
    sources: [osha('1910.133', 'Eye and face protection')],
  },
  hearing: {
    label: 'noise',
    words:
      'Wear ear protection before it is loud, not after. If you have to shout at arm’s length, you need it.',
    sources: [osha('1910.95', 'Occupational noise exposure'), hse('L108', 'Controlling noise at work')],
  },
  chemicals: {
    label: 'chemicals',
    words:
      'Read the safety data sheet of the product that you have, wear the gloves that it names, and never mix cleaners. Add acid to water, not water to acid.',
    sources: [osha('1910.1200', 'Hazard communication')],
  },
  solvents: {
    label: 'solvents near an arc',
    words:
      'Let degreased parts dry fully, and keep brake and parts cleaners away from arc and flame: some give off poison gas there. Put rags and open tins outside first.',
    sources: [HOT_WORK, WELDING],
  },
  food: {
    label: 'food contact',
    words:
      'What touches fruit or juice has to be a metal, finish and grease meant for food: no zinc, no old brass of unknown make, no common oil. Selling what comes out is under your local food law.',
    sources: [
      {
        publisher: 'European Union',
        title: 'Materials and articles intended to come into contact with food',
        number: 'Regulation (EC) No 1935/2004',
      },
      {
        publisher: 'US Food and Drug Administration',
        title: 'Lubricants with incidental food contact',
        number: '21 CFR 178.3570',
      },
    ],
  },
};
