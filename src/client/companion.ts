import { BenchNow } from './bench-now.ts';
import { MomentAsk } from './moment-ask.ts';
import { MomentLink } from './moment-link.ts';
import { NotesNow } from './notes-now.ts';
import { OutsideVideo } from './outside-video.ts';
import { RuleNow } from './rule-now.ts';
import { VideoFollow } from './video-follow.ts';

// What shows the present comes before what tells it, so that nothing misses the first word.
customElements.define('bench-now', BenchNow);
customElements.define('notes-now', NotesNow);
customElements.define('rule-now', RuleNow);
customElements.define('moment-link', MomentLink);
customElements.define('moment-ask', MomentAsk);
customElements.define('outside-video', OutsideVideo);
customElements.define('video-follow', VideoFollow);
