import { may } from '../domain/permissions.ts';
import { type Standing } from '../domain/roles.ts';
import { paths } from '../paths.ts';

/** A labelled group of links in the menu of the signed-in side. */
export interface BenchGroup {
  readonly label?: string | undefined;
  readonly items: readonly {
    readonly label: string;
    readonly href: string;
    readonly current?: boolean | undefined;
    /** How many things wait there. */
    readonly count?: number | undefined;
  }[];
}

/**
 * The menu of one workshop's bench for a role.
 * @param here the path of the page that shows it
 * @param build the build that the page is about, if it is about one
 */
export function benchGroups(
  workshop: { readonly slug: string; readonly name: string },
  role: Standing,
  here: string,
  build?: { readonly slug: string; readonly name: string },
): readonly BenchGroup[] {
  const item = (label: string, href: string) => ({
    label,
    href,
    current: here === href || (build !== undefined && here.startsWith(`${href}/`)),
  });
  const today = paths.today(workshop.slug);
  const questions = paths.questions(workshop.slug);
  return [
    {
      items: [
        { label: 'Today', href: today, current: here === today },
        {
          label: 'Questions',
          href: questions,
          current: here === questions || here.startsWith(`${questions}/`),
        },
      ],
    },
    ...(build
      ? [
          {
            label: build.name,
            items: [
              item('Diary', paths.diary(workshop.slug, build.slug)),
              item('Stages', paths.stages(workshop.slug, build.slug)),
              item('Parts', paths.parts(workshop.slug, build.slug)),
              item('Footage', paths.footage(workshop.slug, build.slug)),
              item('Worksheets', paths.benchWorksheets(workshop.slug, build.slug)),
              item('Episodes', paths.episodes(workshop.slug, build.slug)),
              item('This build', paths.buildSettings(workshop.slug, build.slug)),
            ],
          },
        ]
      : []),
    {
      label: workshop.name,
      items: [
        item('Team', paths.team(workshop.slug)),
        item('Storage', paths.storage(workshop.slug)),
        ...(may(role, 'address.see') ? [item('Subscribers', paths.subscribers(workshop.slug))] : []),
        ...(may(role, 'workshop.change-settings')
          ? [item('Settings', paths.workshopSettings(workshop.slug))]
          : []),
      ],
    },
  ];
}

/** The menu outside any workshop. */
export function accountGroups(
  workshops: readonly { readonly slug: string; readonly name: string }[],
  here: string,
): readonly BenchGroup[] {
  const item = (label: string, href: string) => ({ label, href, current: here === href });
  return [
    ...(workshops.length > 0
      ? [{ label: 'Workshops', items: workshops.map(({ name, slug }) => item(name, paths.today(slug))) }]
      : []),
    { label: 'You', items: [item('Account', paths.account()), item('Make a workshop', paths.newWorkshop())] },
  ];
}
