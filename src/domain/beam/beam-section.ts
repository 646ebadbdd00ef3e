import { type Answer, right, wrong } from '../answer.ts';

/** What bending asks of a section; mm. */
export interface BeamSection {
  /** Second moment of area about the lying axis, mm4. */
  readonly inertia: number;
  /** Standing height, mm. */
  readonly height: number;
}

/** A solid rectangle, standing on its width. */
export function solidBar(width: number, height: number): BeamSection {
  return { inertia: (width * height ** 3) / 12, height };
}

/** A solid round. */
export function solidRound(diameter: number): BeamSection {
  return { inertia: (Math.PI / 64) * diameter ** 4, height: diameter };
}

/** A round tube. */
export function roundTube(outside: number, wall: number): Answer<BeamSection> {
  const inside = outside - 2 * wall;
  return inside <= 0
    ? wrong('The wall leaves no bore.')
    : right({ inertia: (Math.PI / 64) * (outside ** 4 - inside ** 4), height: outside });
}

/**
 * A hollow section with its rounded corners, by the formula of EN 10219-2, annex B, from memory: outer radius 2T to
 * 6 mm wall, 2.5T to 10 mm, 3T above; inner radius a wall less.
 */
export function hollowSection(height: number, width: number, wall: number): Answer<BeamSection> {
  const radii = wall <= 6 ? 2 : wall <= 10 ? 2.5 : 3;
  const [outer, inner] = [radii * wall, (radii - 1) * wall];
  if (2 * outer >= Math.min(height, width)) return wrong('The wall is too thick for this section.');
  const [innerHeight, innerWidth] = [height - 2 * wall, width - 2 * wall];
  const corner = (radius: number, tall: number) => {
    const area = (1 - Math.PI / 4) * radius ** 2;
    const reach = tall / 2 - ((10 - 3 * Math.PI) / (12 - 3 * Math.PI)) * radius;
    const own = (1 / 3 - Math.PI / 16 - 1 / (3 * (12 - 3 * Math.PI))) * radius ** 4;
    return 4 * (own + area * reach ** 2);
  };
  const inertia =
    (width * height ** 3 - innerWidth * innerHeight ** 3) / 12 -
    corner(outer, height) +
    corner(inner, innerHeight);
  return right({ inertia, height });
}
