/** Two clips at 25 frames a second: 10 s of C0043 from its label 00:00:31:00, then 5 s of C0044. */
export const LIST = `TITLE: Press 4
FCM: NON-DROP FRAME

001  C0043    V     C        00:00:31:00 00:00:41:00 01:00:00:00 01:00:10:00
* FROM CLIP NAME: C0043.MP4
* LOC: 01:00:02:00 RED     SHAFT IN
002  C0044    V     C        00:00:05:00 00:00:10:00 01:00:10:00 01:00:15:00
* FROM CLIP NAME: C0044.MP4
`;

/** The same later: C0043 comes 2 s later and is shorter, C0044 is gone, C0050 is new. */
export const NEXT_LIST = `TITLE: Press 4
001  C0050    V     C        00:00:00:00 00:00:02:00 01:00:00:00 01:00:02:00
* FROM CLIP NAME: C0050.MP4
002  C0043    V     C        00:00:31:00 00:00:39:00 01:00:02:00 01:00:10:00
* FROM CLIP NAME: C0043.MP4
`;
