/** One event of a stream: its name and its data, lines joined by line feeds. */
export interface StreamEvent {
  name: string;
  data: string;
}

/**
 * Takes the text of a server-sent event stream in pieces of any size and hands on each event when it is complete.
 * Follows the parsing rules of the HTML standard, section 9.2.6: LF, CR and CR LF end a line, a colon first makes a
 * comment, one space after the colon is dropped, an empty line sends the event, an event without data is not sent.
 * `id` and `retry` are read over: this client reads its lists again after a break, it does not resume.
 */
export function eventStreamParser(onEvent: (event: StreamEvent) => void): { push(text: string): void } {
  let rest = '';
  let name = '';
  let data: string[] = [];
  let atStart = true;

  function line(text: string): void {
    if (text === '') {
      if (data.length > 0) onEvent({ name: name || 'message', data: data.join('\n') });
      name = '';
      data = [];
      return;
    }
    const colon = text.indexOf(':');
    if (colon === 0) return;
    const field = colon < 0 ? text : text.slice(0, colon);
    const value = colon < 0 ? '' : text.slice(colon + 1).replace(/^ /, '');
    if (field === 'event') name = value;
    else if (field === 'data') data.push(value);
  }

  return {
    push(text) {
      rest += text;
      if (atStart && rest.length > 0) {
        if (rest.startsWith('\uFEFF')) rest = rest.slice(1);
        atStart = false;
      }
      for (;;) {
        const end = rest.search(/[\r\n]/);
        // A carriage return at the very end may be the first half of CR LF: wait for what follows.
        if (end < 0 || (rest[end] === '\r' && end === rest.length - 1)) return;
        line(rest.slice(0, end));
        rest = rest.slice(rest.startsWith('\r\n', end) ? end + 2 : end + 1);
      }
    },
  };
}
