/**
 * Every problem that the API answers with: a closed list. The code is for programs, the words are for people, and `todo`
 * says what to do. A more exact `todo` may be given where a problem is raised; the rest never changes.
 */
export const PROBLEMS = {
  'bad-json': {
    status: 400,
    title: 'The body is no JSON',
    todo: 'Send JSON in UTF-8, as RFC 8259 has it.',
  },
  'invalid-fields': {
    status: 422,
    title: 'Some fields cannot be taken',
    todo: 'Correct the fields listed under errors.',
  },
  'not-signed-in': {
    status: 401,
    title: 'Nobody is signed in',
    todo: 'Sign in, or send a personal token as Authorization: Bearer.',
  },
  'wrong-sign-in': {
    status: 401,
    title: 'E-mail address or password is wrong',
    todo: 'Check both and try again.',
  },
  'slow-down': {
    status: 429,
    title: 'Too many wrong passwords',
    todo: 'Wait as many seconds as Retry-After says, then try again.',
  },
  'other-site': {
    status: 403,
    title: 'The request comes from another site',
    todo: "Send it from this server's own pages, or with a personal token instead of the cookie.",
  },
  'needs-session': {
    status: 403,
    title: 'A token may not do this',
    todo: 'Sign in in a browser and do it there.',
  },
  'not-allowed': {
    status: 403,
    title: 'Your role does not allow this',
    todo: 'Ask an owner of the budget for another role.',
  },
  'needs-administrator': {
    status: 403,
    title: 'Only the administrator may do this',
    todo: 'Ask the administrator of this server.',
  },
  'not-found': {
    status: 404,
    title: 'There is no such thing, or it is not yours to see',
    todo: 'Check the address, or ask an owner to make you a member.',
  },
  'content-type': {
    status: 415,
    title: 'The body has another type than this address takes',
    todo: 'Send the Content-Type that openapi.json names.',
  },
  'too-large': {
    status: 413,
    title: 'The body is too large',
    todo: 'Send less at once.',
  },
  'wrong-code': {
    status: 403,
    title: 'The code is wrong or has been used',
    todo: 'Take the code that the server printed when it was last started.',
  },
  'password-refused': {
    status: 422,
    title: 'This password cannot be used',
    todo: 'Choose another one.',
  },
  'wrong-password': {
    status: 403,
    title: 'The current password is wrong',
    todo: 'Type the password that you signed in with.',
  },
  'e-mail-taken': {
    status: 409,
    title: 'Somebody has this e-mail address already',
    todo: 'Look among the people of this server.',
  },
  'no-such-person': {
    status: 404,
    title: 'There is no such person',
    todo: 'Take an id from the people of this server.',
  },
  'last-owner': {
    status: 409,
    title: 'A budget needs an owner',
    todo: 'Make somebody else an owner first.',
  },
  conflict: {
    status: 409,
    title: 'The budget has moved on',
    todo: 'Read it again, and send the edit with the seq that you have seen.',
  },
  'key-reused': {
    status: 409,
    title: 'This Idempotency-Key belongs to another edit',
    todo: 'Send a new key with a new edit.',
  },
  'edit-refused': {
    status: 422,
    title: 'The edit cannot be made',
    todo: 'Correct it as the detail says.',
  },
  'not-stored': {
    status: 503,
    title: 'The edit could not be stored',
    todo: 'Send it again with the same Idempotency-Key.',
  },
  'budget-locked': {
    status: 503,
    title: 'The budget cannot be served',
    todo: 'Tell the administrator; the list of budgets says what is wrong with it.',
  },
  'not-ready': {
    status: 503,
    title: 'The server is not ready',
    todo: 'Try again in a few seconds.',
  },
  internal: {
    status: 500,
    title: 'The server failed',
    todo: 'Tell the administrator the number under instance; the log has it.',
  },
} as const satisfies Record<string, { status: number; title: string; todo: string }>

export type ProblemCode = keyof typeof PROBLEMS
