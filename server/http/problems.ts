/** Every error that the API gives on purpose. Clients decide by these words, so none is ever renamed. */
export type ProblemCode =
  | 'unreadable'
  | 'broken-entry'
  | 'not-signed-in'
  | 'sign-in-refused'
  | 'refresh-refused'
  | 'not-yours'
  | 'not-allowed'
  | 'revoked'
  | 'foreign-origin'
  | 'not-there'
  | 'no-such-route'
  | 'wrong-method'
  | 'reset'
  | 'too-large'
  | 'not-json'
  | 'wrong-host'
  | 'slow-down'
  | 'fault'
  | 'unavailable';

export type Fields = Readonly<Record<string, string>>;

export abstract class HttpProblem extends Error {
  abstract readonly code: ProblemCode;
  abstract readonly status: number;
  abstract readonly title: string;
  readonly fields: Fields | undefined;
  readonly headers: Fields | undefined;

  constructor(detail: string, more: { readonly fields?: Fields; readonly headers?: Fields } = {}) {
    super(detail);
    this.fields = more.fields;
    this.headers = more.headers;
  }
}

/** The request does not read as its schema says; `fields` names what is wrong. */
export class Unreadable extends HttpProblem {
  readonly code = 'unreadable';
  readonly status = 400;
  readonly title = 'The request could not be read';
}

/** The hashes of an entry are not those of its text: it travels again as a stub (protocol 3.7). */
export class BrokenEntry extends HttpProblem {
  readonly code = 'broken-entry';
  readonly status = 400;
  readonly title = 'An entry does not fit its own hash';
}

export class NotSignedIn extends HttpProblem {
  readonly code = 'not-signed-in';
  readonly status = 401;
  readonly title = 'Not signed in';
}

export class SignInRefused extends HttpProblem {
  readonly code = 'sign-in-refused';
  readonly status = 401;
  readonly title = 'Sign-in refused';
}

export class RefreshRefused extends HttpProblem {
  readonly code = 'refresh-refused';
  readonly status = 401;
  readonly title = 'The session could not be continued';
}

/** The batch holds an entry of another lab or tablet. */
export class NotYours extends HttpProblem {
  readonly code = 'not-yours';
  readonly status = 403;
  readonly title = 'Not of this tablet';
}

export class NotAllowed extends HttpProblem {
  readonly code = 'not-allowed';
  readonly status = 403;
  readonly title = 'Not allowed';
}

export class Revoked extends HttpProblem {
  readonly code = 'revoked';
  readonly status = 403;
  readonly title = 'This tablet was revoked';

  constructor() {
    super('A lead revoked this tablet. What is on it stays on it and can be handed over by rescue file.');
  }
}

export class ForeignOrigin extends HttpProblem {
  readonly code = 'foreign-origin';
  readonly status = 403;
  readonly title = 'The request came from another site';
}

/** Also the answer for what belongs to another lab. */
export class NotThere extends HttpProblem {
  readonly code = 'not-there';
  readonly status = 404;
  readonly title = 'Not there';
}

export class NoSuchRoute extends HttpProblem {
  readonly code = 'no-such-route';
  readonly status = 404;
  readonly title = 'The API has no such address';
}

export class WrongMethod extends HttpProblem {
  readonly code = 'wrong-method';
  readonly status = 405;
  readonly title = 'This address does not take this method';
}

/** The tablet's mirror is not of this Book: it fills again from zero (protocol 3.11). */
export class Reset extends HttpProblem {
  readonly code = 'reset';
  readonly status = 409;
  readonly title = 'The mirror is not of this Book';
}

export class TooLarge extends HttpProblem {
  readonly code = 'too-large';
  readonly status = 413;
  readonly title = 'The request is too large';
}

export class NotJson extends HttpProblem {
  readonly code = 'not-json';
  readonly status = 415;
  readonly title = 'The request has to be JSON';
}

export class WrongHost extends HttpProblem {
  readonly code = 'wrong-host';
  readonly status = 421;
  readonly title = 'This server does not answer under that name';
}

export class SlowDown extends HttpProblem {
  readonly code = 'slow-down';
  readonly status = 429;
  readonly title = 'Too many attempts';

  constructor(wait_s: number) {
    super(`Too many attempts to sign in. Try again in ${wait_s} s.`, {
      headers: { 'retry-after': String(wait_s) },
    });
  }
}

export class Fault extends HttpProblem {
  readonly code = 'fault';
  readonly status = 500;
  readonly title = 'The server made a mistake';
}

/** Nothing of the request was done; it may be sent again as it is. */
export class Unavailable extends HttpProblem {
  readonly code = 'unavailable';
  readonly status = 503;
  readonly title = 'The server cannot do that now';
}
