/** The little of the reference parser of CommonMark that the tests use; the package brings no types. */
declare module 'commonmark' {
  export interface Node {
    readonly type: string;
    readonly literal: string | null;
    readonly destination: string | null;
    readonly level: number;
    walker(): { next(): { readonly entering: boolean; readonly node: Node } | null };
  }
  export class Parser {
    parse(text: string): Node;
  }
}
