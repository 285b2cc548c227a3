/** Reads a fixture of this repository from the test server, at once, as the tests expect from Node. */
export function readFileSync(place: URL | string): string {
  const request = new XMLHttpRequest();
  request.open('GET', place instanceof URL ? place.pathname : place, false);
  request.send();
  if (request.status !== 200) throw new Error(`${place}: ${request.status}`);
  return request.responseText;
}
