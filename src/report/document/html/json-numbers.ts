/** Data of the document's script as JSON that can stand in a page: nothing in it can end the element it stands in. */
export function jsonNumbers(data: object): string {
  return JSON.stringify(data).replaceAll('<', '\\u003c');
}
