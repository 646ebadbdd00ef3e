import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { Balloon } from '../../../src/components/Balloon.tsx';
import { Button } from '../../../src/components/Button.tsx';
import { DimensionLine } from '../../../src/components/DimensionLine.tsx';
import { SAMPLE_RULE } from '../../../src/components/drawing-set/sample-rule.ts';
import { Field } from '../../../src/components/Field.tsx';
import { FormSummary } from '../../../src/components/FormSummary.tsx';
import { SteelRule } from '../../../src/components/SteelRule.tsx';

function draw(element: React.ReactElement): Document {
  return new DOMParser().parseFromString(renderToStaticMarkup(element), 'text/html');
}

describe('a field', () => {
  it('is tied to its label, its hint and its error', () => {
    const page = draw(<Field label="Mass" name="mass" hint="In kg." error="Write a mass." required />);
    const input = page.querySelector('input');
    expect(page.querySelector('label')?.htmlFor).toBe(input?.id);
    const described = (input?.getAttribute('aria-describedby') ?? '').split(' ');
    expect(described.map((id) => page.getElementById(id)?.textContent)).toEqual(['In kg.', 'Write a mass.']);
    expect(input?.getAttribute('aria-invalid')).toBe('true');
  });

  it('can be found from the summary of what is wrong', () => {
    const field = draw(<Field label="Mass" name="mass" />).querySelector('input');
    const link = draw(<FormSummary errors={[{ field: 'mass', message: 'Write a mass.' }]} />).querySelector(
      'a',
    );
    expect(link?.getAttribute('href')).toBe(`#${field?.id ?? ''}`);
  });
});

describe('a button', () => {
  it('that cannot be pressed says why', () => {
    const page = draw(
      <Button disabled reason="Two checks are open.">
        Publish
      </Button>,
    );
    const button = page.querySelector('button');
    expect(button?.disabled).toBe(true);
    expect(page.getElementById(button?.getAttribute('aria-describedby') ?? '')?.textContent).toBe(
      'Two checks are open.',
    );
  });

  it('that leads somewhere is a link, and none while it is disabled', () => {
    expect(
      draw(<Button href="/parts">Parts</Button>)
        .querySelector('a')
        ?.getAttribute('href'),
    ).toBe('/parts');
    const off = draw(
      <Button href="/parts" disabled>
        Parts
      </Button>,
    ).querySelector('a');
    expect(off?.hasAttribute('href')).toBe(false);
    expect(off?.getAttribute('aria-disabled')).toBe('true');
  });
});

describe('a balloon', () => {
  it('says in words what its fill and its dashes mean', () => {
    expect(draw(<Balloon number="118" name="bearing housing" filled />).body.textContent).toContain(
      'Part 118, bearing housing, on the bench now',
    );
    expect(draw(<Balloon number={null} dashed />).body.textContent).toContain(
      'Part without a number, not in the plans',
    );
  });
});

describe('a size', () => {
  it('has both systems in the page, the given one first', () => {
    const units = [
      ...draw(<DimensionLine mm="38.1 mm" inch="1 1/2 in" given="inch" />).querySelectorAll('[data-unit]'),
    ];
    expect(units.map((unit) => unit.getAttribute('data-unit'))).toEqual(['inch', 'mm']);
  });

  it('known in one system only is never hidden by the choice of units', () => {
    const size = draw(<DimensionLine mm="35.009 mm" />).querySelector('.dimension');
    expect(size?.getAttribute('data-forms')).toBe('one');
  });
});

describe('the steel rule', () => {
  it('links to every note once for each width, named by its time and words', () => {
    const page = draw(<SteelRule {...SAMPLE_RULE} />);
    const links = [...page.querySelectorAll('a[aria-label^="3:40"]')];
    expect(links.length).toBeGreaterThan(0);
    expect(new Set(links.map((link) => link.getAttribute('aria-label'))).size).toBe(1);
  });

  it('says everything it shows in words too, in the order of time', () => {
    const lines = [...draw(<SteelRule {...SAMPLE_RULE} />).querySelectorAll('ol li')].map(
      (line) => line.textContent,
    );
    expect(lines[0]).toBe('0:00, chapter: Drum shaft');
    expect(lines).toContain('3:40, on the bench: 118, bearing housing');
    expect(lines).toContain('2:26, camera off until 2:42: second seat turned');
    expect(lines).toContain('5:06, caution: Guard the drum before it turns');
  });

  it('carries no style attribute, which the content policy would refuse', () => {
    expect(renderToStaticMarkup(<SteelRule {...SAMPLE_RULE} />)).not.toMatch(/\sstyle=/);
  });

  it('of an episode without length is empty', () => {
    expect(draw(<SteelRule length={0} />).querySelector('svg')).toBeNull();
  });
});
