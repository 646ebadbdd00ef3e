export const ANSWERS = ['accept', 'refuse', 'defer', 'drop', 'hang'] as const;
export type Answer = (typeof ANSWERS)[number];

/**
 * What to do with mail to one recipient, or to all with `*`.
 * refuse answers 550 and defer 451, both to RCPT TO. drop cuts the connection where the answer to the
 * message is due, hang gives none until the connection closes; both keep the message only with `keep`.
 */
export type Rule = {
  readonly recipient: string;
  readonly answer: Answer;
  /** How many more times it holds; for ever when left out. */
  readonly times?: number;
  readonly keep?: boolean;
};

/** Reads a rule from a request; what is wrong is said in a sentence. */
export function parseRule(value: unknown): Rule | string {
  if (typeof value !== 'object' || value === null) return 'Send a JSON object.';
  const { recipient, answer, times, keep } = value as Record<string, unknown>;
  if (typeof recipient !== 'string' || recipient === '') return 'recipient is an address, or * for all.';
  const known = ANSWERS.find((one) => one === answer);
  if (known === undefined) return `answer is one of ${ANSWERS.join(', ')}.`;
  if (times !== undefined && !(Number.isInteger(times) && Number(times) > 0))
    return 'times is a whole number from 1.';
  if (keep !== undefined && typeof keep !== 'boolean') return 'keep is true or false.';
  return {
    recipient: recipient.toLowerCase(),
    answer: known,
    ...(times !== undefined && { times: Number(times) }),
    ...(keep !== undefined && { keep }),
  };
}

/** The rules in force. A rule for a recipient goes before the one for all. */
export function createBehaviour() {
  const rules = new Map<string, Rule>();

  function use(rule: Rule): Rule {
    if (rule.times === 1) rules.delete(rule.recipient);
    else if (rule.times !== undefined) rules.set(rule.recipient, { ...rule, times: rule.times - 1 });
    return rule;
  }

  return {
    set: (rule: Rule) => void rules.set(rule.recipient, rule),
    clear: () => {
      rules.clear();
    },
    list: () => [...rules.values()],

    /** The rule for one of the recipients if its answer is due now; each call uses it up once. */
    take(recipients: readonly string[], due: readonly Answer[]): Rule | undefined {
      for (const recipient of recipients) {
        const rule = rules.get(recipient.toLowerCase()) ?? rules.get('*');
        if (rule && due.includes(rule.answer)) return use(rule);
      }
      return undefined;
    },
  };
}

export type Behaviour = ReturnType<typeof createBehaviour>;
