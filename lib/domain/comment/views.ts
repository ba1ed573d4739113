export interface CommentView {
  readonly id: string;
  readonly byName: string;
  readonly at: string;
  readonly body: string;
  readonly mentionNames: readonly string[];
  /** Own ones, and for the leader all. */
  readonly isDeletable: boolean;
}

export interface CommentThread {
  readonly comments: readonly CommentView[];
  /** Who can be called by name. */
  readonly people: readonly { readonly id: string; readonly name: string }[];
}
