const part = encodeURIComponent;

/** A path that stays on this site: anything else, such as //elsewhere.example, becomes the front page of the bench. */
export function ownPath(path: string | null | undefined): string {
  return path !== null && path !== undefined && /^\/(?![/\\])[^\\\s]*$/.test(path) ? path : paths.bench();
}

/** Every address of the product, as a path below PUBLIC_URL. */
export const paths = {
  frontDoor: () => '/',
  workshop: (workshop: string) => `/w/${part(workshop)}`,

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
  invitation: (id: string, token: string) => `/invitations/${part(id)}?token=${part(token)}`,

  bench: () => '/bench',
  newWorkshop: () => '/bench/new',
  today: (workshop: string) => `/bench/${part(workshop)}`,
  team: (workshop: string) => `/bench/${part(workshop)}/team`,
  workshopSettings: (workshop: string) => `/bench/${part(workshop)}/settings`,

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
    acceptInvitation: (invitation: string) => `/api/invitations/${part(invitation)}/accept`,
  },
} as const;

/** Whether the front server may render a page once for everyone: no session, no query. */
export function isPublicPage(pathname: string): boolean {
  return pathname === '/' || pathname.startsWith('/w/');
}
