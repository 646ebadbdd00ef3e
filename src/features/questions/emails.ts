import { type Mail } from '../../domain/mail.ts';

/** So much of an answer stands in the mail; the rest is behind the link. */
const ANSWER_SHOWN = 600;

export function confirmQuestionMail(props: {
  readonly workshop: string;
  readonly name: string;
  readonly text: string;
  readonly days: number;
  readonly link: string;
}): Mail {
  return {
    subject: `${props.workshop}: send your question`,
    blocks: [
      {
        kind: 'paragraph',
        text: `A question to ${props.workshop} was written with this address, by ${props.name}:`,
      },
      { kind: 'paragraph', text: props.text },
      { kind: 'action', label: 'Look at it and send it', url: props.link },
      {
        kind: 'small',
        text: `The link holds for ${String(props.days)} days. If it was not you, do nothing: the question goes nowhere.`,
      },
    ],
  };
}

export function urgentQuestionMail(props: {
  readonly workshop: string;
  readonly text: string;
  readonly link: string;
}): Mail {
  return {
    subject: `${props.workshop}: an urgent question`,
    blocks: [
      {
        kind: 'paragraph',
        text: 'Somebody of your team marked this question urgent: a wrong step may hurt someone.',
      },
      { kind: 'paragraph', text: props.text },
      { kind: 'action', label: 'Open the question', url: props.link },
      { kind: 'small', text: 'It is marked risky, so only your answer goes out.' },
    ],
  };
}

export function answerMail(props: {
  readonly workshop: string;
  readonly name: string;
  readonly text: string;
  readonly answer: string;
  readonly link: string;
}): Mail {
  const { answer } = props;
  const shown =
    answer.length <= ANSWER_SHOWN ? answer : `${answer.slice(0, ANSWER_SHOWN).replace(/\s+\S*$/, '')} …`;
  return {
    subject: `${props.workshop}: your question is answered`,
    blocks: [
      { kind: 'paragraph', text: `${props.name}, you asked:` },
      { kind: 'paragraph', text: props.text },
      { kind: 'paragraph', text: `${props.workshop} answers:` },
      { kind: 'paragraph', text: shown },
      { kind: 'action', label: 'Read it where it stands', url: props.link },
      { kind: 'small', text: 'You get this one mail because you asked.' },
    ],
  };
}
