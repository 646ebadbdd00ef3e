/** What an announcement says, fixed when it is sent. */
export interface AnnouncementContent {
  readonly workshop: string;
  readonly build: string;
  readonly number: number;
  readonly title: string;
  readonly about: string;
  /** The owner's own, above the rest; may be empty. */
  readonly words: string;
  /** The whole address of the episode's page. */
  readonly link: string;
}
