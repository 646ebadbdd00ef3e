import { describe, expect, test } from 'vitest';
import { cautionsOf, findRisks, RISKS } from '../../../../src/domain/questions/risks.ts';

describe('a question is risky by what it asks', () => {
  test.each([
    ['Is 50 x 12 flat thick enough for the top beam?', 'load'],
    ['Could I press with 12 tonnes instead of 8?', 'load'],
    ['Will it hold if I leave the gussets out?', 'load'],
    ['What do I set the relief valve to?', 'pressure'],
    ['My hose is 2500 psi, is that fine?', 'pressure'],
    ['Can a G 3/8 fitting go into a 3/8 NPT hole?', 'pressure'],
    ['How did you get the frame up, with slings?', 'lifting'],
    ['Where did you put the lifting eyes?', 'lifting'],
    ['Which fuse is in front of the motor?', 'electrics'],
    ['Do I run it on 240 V?', 'electrics'],
    ['Can I run it single-phase?', 'electrics'],
    ['Do I need a guard over the drum?', 'guards'],
    ['Could the emergency stop be on the other side?', 'guards'],
    ['How near the drum do your fingers go?', 'guards'],
    ['Did you take the zinc off first?', 'fumes'],
    ['Is plated bolt stock all right to heat?', 'fumes'],
    ['What current for E7018 at 3.2 mm?', 'welds'],
    ['My fillet cracked at the toe, why?', 'welds'],
    ['Is it safe to leave it loaded overnight?', 'safety'],
    ['My children help; anything to look out for?', 'safety'],
  ] as const)('%s', (text, risk) => {
    expect(findRisks(text)).toContain(risk);
  });

  test.each([
    'Which glue did you use for the slats?',
    'Where do you buy ash that wide?',
    'Is the drawing for part 118 in the plans?',
    'Why k6 and not j6 for the bearing seat?',
    'What lens is that?',
    'How long did this episode take to film?',
    'The captions say 14 but the note says 40. Which is right?',
  ])('but not: %s', (text) => {
    expect(findRisks(text)).toEqual([]);
  });

  test('or by the caution that it is asked about', () => {
    expect(findRisks('Why?', ['pressure'])).toEqual(['pressure']);
    expect(findRisks('Why?', ['hearing'])).toEqual([]);
  });

  test('with each risk once, in the order of the list', () => {
    const found = findRisks(
      'Weld the guard under pressure: is it safe for the load of 3 tonnes? Welded twice.',
    );
    expect(found).toEqual(RISKS.filter((risk) => found.includes(risk)));
    expect(found).toEqual(expect.arrayContaining(['load', 'pressure', 'guards', 'welds', 'safety']));
  });
});

test('the usual cautions of a risky question are each told once', () => {
  expect(cautionsOf(['welds', 'load', 'safety'])).toEqual(['load']);
  expect(cautionsOf(['pressure', 'electrics', 'nothing of ours'])).toEqual(['pressure', 'electric']);
  expect(cautionsOf([])).toEqual([]);
});
