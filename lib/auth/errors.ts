/** Nobody is signed in, or the sign-in was ended: pages go to the sign-in, the interface answers 401. */
export class SignInNeeded extends Error {
  override readonly name = "SignInNeeded";
  constructor() {
    super("Sign in first: your sign-in is missing, ended or has run out.");
  }
}

/** A change that came with a cookie and not from our own pages. */
export class ForeignOrigin extends Error {
  override readonly name = "ForeignOrigin";
  constructor() {
    super("This change did not come from Greenarc's own pages, so it was refused. Open the page here and try again.");
  }
}

export class TooManyTries extends Error {
  override readonly name = "TooManyTries";
  constructor(readonly retryAfterS: number) {
    super(`Too many tries. Wait ${retryAfterS < 90 ? `${retryAfterS} s` : `${Math.ceil(retryAfterS / 60)} min`}, then try again.`);
  }
}

export class WrongPassword extends Error {
  override readonly name = "WrongPassword";
  readonly field = "password";
  constructor() {
    super("That is not your password. Nothing was signed; type it again.");
  }
}
