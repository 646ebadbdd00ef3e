/**
 * Swaps "Sign in" for the reader's own way to the bench. Public pages are the same bytes for everyone, so this
 * asks /api/me, and only where the hint cookie says that someone is signed in.
 */
class AccountLink extends HTMLElement {
  connectedCallback(): void {
    if (/\.signed_in=1(;|$)/.test(document.cookie)) void this.show();
  }

  private async show(): Promise<void> {
    const answer = await fetch(this.dataset['me'] ?? '/api/me', { headers: { accept: 'application/json' } });
    if (!answer.ok) return;
    const me = (await answer.json()) as {
      name: string;
      workshops: readonly { slug: string; name: string }[];
    } | null;
    const link = this.querySelector('a');
    if (me === null || link === null) return;
    const [only] = me.workshops;
    link.textContent = me.workshops.length === 1 && only ? only.name : me.name;
    link.href = this.dataset['bench'] ?? '/bench';
  }
}

customElements.define('account-link', AccountLink);
