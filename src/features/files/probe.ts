/** When a camera says something was taken. */
export interface CameraTime {
  /** Its own wall clock: 2026-03-14T14:22:07, without a zone. */
  readonly wallTime: string;
  /** What it says it was off UTC, such as +01:00; null when it does not say. */
  readonly offset: string | null;
  /** The IANA zone taken when it does not say: the workshop's; null when it does. */
  readonly assumedZone: string | null;
}

/** What was found out about a file, kept with it. */
export interface Probe {
  readonly camera?: CameraTime | undefined;
  /** Names of the codecs, as the trade writes them in lower case: h264, aac. */
  readonly videoCodec?: string | undefined;
  readonly audioCodec?: string | undefined;
  /** The label of the first frame, when the camera wrote one. */
  readonly timecode?: string | undefined;
  /** Whether frames come at uneven times. */
  readonly variableRate?: boolean | undefined;
  /** Whether those times were left unread: there are too many of them. */
  readonly frameTimesUnread?: boolean | undefined;
  /** The camera by the file's own tags: maker and model. */
  readonly filmedWith?: string | undefined;
  /** Which text it is: csv, vtt, srt, edl, otio. */
  readonly format?: string | undefined;
  /** Whether the streams of the playable copy are the camera's own, or made anew. */
  readonly copied?: boolean | undefined;
}
