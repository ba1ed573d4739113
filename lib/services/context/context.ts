/** Who asks. */
export interface Actor {
  readonly userId: string;
  readonly name: string;
  readonly email: string;
}

/** What every service is called with. */
export interface Context {
  readonly actor: Actor;
  readonly requestId: string;
}
