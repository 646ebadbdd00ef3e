const part = encodeURIComponent;

function onBench(workshop: string, build: string, rest = ''): string {
  return `/bench/${part(workshop)}/${part(build)}${rest === '' ? '' : `/${rest}`}`;
}

/** A path that stays on this site: anything else, such as //elsewhere.example, becomes the front page of the bench. */
export function ownPath(path: string | null | undefined): string {
  return path !== null && path !== undefined && /^\/(?![/\\])[^\\\s]*$/.test(path) ? path : paths.bench();
}

/** Every address of the product, as a path below PUBLIC_URL. */
export const paths = {
  frontDoor: () => '/',
  workshop: (workshop: string) => `/w/${part(workshop)}`,
  workshopFeed: (workshop: string) => `/w/${part(workshop)}/feed.xml`,
  build: (workshop: string, build: string) => `/w/${part(workshop)}/${part(build)}`,
  buildFeed: (workshop: string, build: string) => `/w/${part(workshop)}/${part(build)}/feed.xml`,
  /** @param at seconds into the episode, the one time form in addresses */
  episode: (workshop: string, build: string, number: number, at?: number) =>
    `/w/${part(workshop)}/${part(build)}/episodes/${String(number)}${at === undefined ? '' : `?t=${String(at)}`}`,
  episodePrint: (workshop: string, build: string, number: number) =>
    `/w/${part(workshop)}/${part(build)}/episodes/${String(number)}/print`,
  episodeCaptions: (workshop: string, build: string, number: number, captions: string) =>
    `/w/${part(workshop)}/${part(build)}/episodes/${String(number)}/captions/${part(captions)}.vtt`,
  part: (workshop: string, build: string, partId: string) =>
    `/w/${part(workshop)}/${part(build)}/parts/${part(partId)}`,
  keptWorksheet: (workshop: string, build: string, worksheet: string) =>
    `/w/${part(workshop)}/${part(build)}/worksheets/${part(worksheet)}`,
  /** @param build when only one build is asked for */
  subscribe: (workshop: string, build?: string) =>
    `/w/${part(workshop)}/${build === undefined ? '' : `${part(build)}/`}subscribe`,
  question: (workshop: string, build: string, question: string) =>
    `/w/${part(workshop)}/${part(build)}/questions/${part(question)}`,
  /** @param about what the question is about: an episode by number and seconds into it, a part, a note */
  ask: (
    workshop: string,
    build: string,
    about: Readonly<Partial<Record<'episode' | 't' | 'part' | 'note', string | number>>> = {},
  ) => {
    const query = new URLSearchParams(Object.entries(about).map(([name, value]) => [name, String(value)]));
    return `/w/${part(workshop)}/${part(build)}/ask${query.size === 0 ? '' : `?${query.toString()}`}`;
  },
  media: (file: string, variant: string) => `/media/${part(file)}/${part(variant)}`,

  worksheets: () => '/worksheets',
  worksheet: (sheet: string) => `/worksheets/${part(sheet)}`,

  signUp: () => '/sign-up',
  checkMail: () => '/sign-up/check-mail',
  confirmAddress: (token: string) => `/confirm?token=${part(token)}`,
  signIn: (next?: string) => (next === undefined ? '/sign-in' : `/sign-in?next=${part(next)}`),
  secondStep: (next?: string) => (next === undefined ? '/sign-in/code' : `/sign-in/code?next=${part(next)}`),
  askSignInLink: () => '/sign-in/link',
  signInLink: (token: string) => `/sign-in/open?token=${part(token)}`,
  askReset: () => '/reset',
  resetPassword: (token: string) => `/reset/password?token=${part(token)}`,
  confirmNewAddress: (token: string) => `/account/new-address?token=${part(token)}`,
  account: () => '/account',
  secondFactor: (next?: string) =>
    next === undefined ? '/account/second-factor' : `/account/second-factor?next=${part(next)}`,
  confirmQuestion: (id: string, token: string) => `/questions/${part(id)}?token=${part(token)}`,
  invitation: (id: string, token: string) => `/invitations/${part(id)}?token=${part(token)}`,
  askedToSubscribe: () => '/subscriptions/asked',
  confirmSubscription: (subscriber: string, token: string) =>
    `/subscriptions/${part(subscriber)}/confirm?token=${part(token)}`,
  leave: (subscriber: string, token: string) =>
    `/subscriptions/${part(subscriber)}/leave?token=${part(token)}`,

  bench: () => '/bench',
  newWorkshop: () => '/bench/new',
  today: (workshop: string) => `/bench/${part(workshop)}`,
  team: (workshop: string) => `/bench/${part(workshop)}/team`,
  workshopSettings: (workshop: string) => `/bench/${part(workshop)}/settings`,
  subscribers: (workshop: string) => `/bench/${part(workshop)}/subscribers`,
  questions: (workshop: string, list?: string) =>
    `/bench/${part(workshop)}/questions${list === undefined ? '' : `?list=${part(list)}`}`,
  pasteQuestion: (workshop: string, build?: string) =>
    `/bench/${part(workshop)}/questions/paste${build === undefined ? '' : `?build=${part(build)}`}`,
  benchQuestion: (workshop: string, question: string) =>
    `/bench/${part(workshop)}/questions/${part(question)}`,
  newBuild: (workshop: string) => `/bench/${part(workshop)}/new`,
  storage: (workshop: string) => `/bench/${part(workshop)}/storage`,
  benchBuild: (workshop: string, build: string) => onBench(workshop, build),
  diary: (workshop: string, build: string) => onBench(workshop, build, 'diary'),
  stages: (workshop: string, build: string) => onBench(workshop, build, 'stages'),
  parts: (workshop: string, build: string) => onBench(workshop, build, 'parts'),
  benchPart: (workshop: string, build: string, partId: string) =>
    onBench(workshop, build, `parts/${part(partId)}`),
  importParts: (workshop: string, build: string) => onBench(workshop, build, 'parts/import'),
  benchWorksheets: (workshop: string, build: string) => onBench(workshop, build, 'worksheets'),
  benchWorksheet: (workshop: string, build: string, worksheet: string) =>
    onBench(workshop, build, `worksheets/${part(worksheet)}`),
  /** @param asked which day, camera and stage are shown */
  footage: (workshop: string, build: string, asked: Readonly<Record<string, string>> = {}) => {
    const query = new URLSearchParams(asked);
    return `${onBench(workshop, build, 'footage')}${query.size === 0 ? '' : `?${query.toString()}`}`;
  },
  addFootage: (workshop: string, build: string) => onBench(workshop, build, 'footage/add'),
  cameras: (workshop: string, build: string) => onBench(workshop, build, 'footage/cameras'),
  files: (workshop: string, build: string) => onBench(workshop, build, 'footage/files'),
  clip: (workshop: string, build: string, clip: string) =>
    onBench(workshop, build, `footage/clips/${part(clip)}`),
  /** The page for a phone that is filmed. @param timeZone an IANA name */
  slate: (timeZone: string) => `/slate?zone=${part(timeZone)}`,
  buildSettings: (workshop: string, build: string) => onBench(workshop, build, 'settings'),
  episodes: (workshop: string, build: string) => onBench(workshop, build, 'episodes'),
  episodesOutAlready: (workshop: string, build: string) => onBench(workshop, build, 'episodes/out-already'),
  desk: (workshop: string, build: string, episode: string) =>
    onBench(workshop, build, `episodes/${part(episode)}`),
  /** @param number of the version to show; the newest when left out */
  edit: (workshop: string, build: string, episode: string, number?: number) =>
    `${onBench(workshop, build, `episodes/${part(episode)}/edit`)}${number === undefined ? '' : `?version=${String(number)}`}`,
  /** The edit page with what moving by the captions would do. */
  captionMove: (workshop: string, build: string, episode: string) =>
    `${onBench(workshop, build, `episodes/${part(episode)}/edit`)}?look=captions#by-captions`,
  leaving: (workshop: string, build: string, episode: string) =>
    onBench(workshop, build, `episodes/${part(episode)}/text`),
  publish: (workshop: string, build: string, episode: string) =>
    onBench(workshop, build, `episodes/${part(episode)}/publish`),
  announcement: (workshop: string, build: string, episode: string) =>
    onBench(workshop, build, `episodes/${part(episode)}/announcement`),
  preview: (workshop: string, build: string, episode: string) =>
    onBench(workshop, build, `episodes/${part(episode)}/preview`),

  api: {
    me: () => '/api/me',
    account: (action: string) => `/api/account/${action}`,
    workshops: () => '/api/workshops',
    workshopSettings: (workshop: string) => `/api/workshops/${part(workshop)}/settings`,
    invitations: (workshop: string) => `/api/workshops/${part(workshop)}/invitations`,
    withdrawInvitation: (workshop: string, invitation: string) =>
      `/api/workshops/${part(workshop)}/invitations/${part(invitation)}/withdraw`,
    changeRole: (workshop: string, member: string) =>
      `/api/workshops/${part(workshop)}/team/${part(member)}/role`,
    removeMember: (workshop: string, member: string) =>
      `/api/workshops/${part(workshop)}/team/${part(member)}/remove`,
    leaveTeam: (workshop: string) => `/api/workshops/${part(workshop)}/team/leave`,
    /** @param rest what of the workshop, such as `builds` or `builds/press/parts`; ids and names are safe in it */
    inWorkshop: (workshop: string, rest: string) => `/api/workshops/${part(workshop)}/${rest}`,
    inBuild: (workshop: string, build: string, rest: string) =>
      `/api/workshops/${part(workshop)}/builds/${part(build)}/${rest}`,
    confirmSubscription: (subscriber: string) => `/api/subscriptions/${part(subscriber)}/confirm`,
    /** Where a mailbox that leaves in one click posts to; its token is its authority. */
    leave: (subscriber: string, token: string) =>
      `/api/subscriptions/${part(subscriber)}/leave/${part(token)}`,
    bounces: (token: string) => `/api/bounces/${part(token)}`,
    sortQuestion: (workshop: string, question: string, action: string) =>
      `/api/workshops/${part(workshop)}/questions/${part(question)}/${action}`,
    confirmQuestion: (question: string) => `/api/questions/${part(question)}/confirm`,
    acceptInvitation: (invitation: string) => `/api/invitations/${part(invitation)}/accept`,
  },
} as const;

/** Whether a path takes whole lists, which are larger than other requests. */
export function takesLists(pathname: string): boolean {
  return /^\/api\/workshops\/[^/]+\/builds\/[^/]+\/(parts\/import|footage\/clips(\/import)?|episodes\/[^/]+\/(captions|edits|edits\/preview))$/.test(
    pathname,
  );
}

/** The page that asks a question knows who is signed in, and what is asked about. */
const ASK_PAGE = /^\/w\/[^/]+\/[^/]+\/ask$/;

/** Whether the front server may render a page once for everyone: no session, no query. */
export function isPublicPage(pathname: string): boolean {
  return pathname === '/' || (pathname.startsWith('/w/') && !ASK_PAGE.test(pathname));
}
