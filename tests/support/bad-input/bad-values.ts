/** What somebody, or something, may put into a field that was meant for something else. */
export const BAD_VALUES: Readonly<Record<string, unknown>> = {
  'left out': undefined,
  nothing: null,
  'an empty text': '',
  blanks: ' \t ',
  'a word': 'shavings',
  '100,000 letters': 'x'.repeat(100_000),
  'a NUL': 'shaft\0',
  'half a character': 'shaft\ud83d',
  'a bell and a backspace': 'sha\u0007ft\b',
  'text that turns around': 'shaft \u202e 411',
  'a script': '<script>alert(1)</script>',
  'a quote and a semicolon': "'; drop table parts; --",
  'a path upwards': '../../../etc/passwd',
  'a formula': '=1+1',
  'an id of nothing': '01890000-0000-7000-8000-000000000000',
  'a day that is none': '2026-02-30',
  'a negative number': -1,
  'a fraction': 1.5,
  'a number beyond 32 bits': 3_000_000_000,
  'a number beyond 64 bits': 1e30,
  'the text of a number beyond 64 bits': '99999999999999999999',
  'yes as a boolean': true,
  'an empty list': [],
  'a list of lists': [[[]]],
  'an empty object': {},
  'an object like a position': { frame: -1, endFrame: 1e30, rate: { num: 0, den: 0 } },
};

/** Bodies that are off as a whole, and the type they are sent as. */
export const BAD_BODIES: Readonly<Record<string, { readonly body: string; readonly type: string }>> = {
  'no JSON': { body: 'shavings', type: 'application/json' },
  'JSON that was cut off': { body: '{"name":"sha', type: 'application/json' },
  'a list': { body: '[]', type: 'application/json' },
  'a text': { body: '"shavings"', type: 'application/json' },
  XML: { body: '<a/>', type: 'application/xml' },
  'a form of parts without a boundary': { body: 'shavings', type: 'multipart/form-data' },
};
