import { eventStreamParser, type StreamEvent } from '@/hooks/events/eventStreamParser';

function read(...pieces: string[]): StreamEvent[] {
  const events: StreamEvent[] = [];
  const parser = eventStreamParser((event) => events.push(event));
  pieces.forEach((piece) => parser.push(piece));
  return events;
}

// The examples are those of the HTML standard, section 9.2.6, "Interpreting an event stream".
describe('eventStreamParser', () => {
  it('joins data lines and names the event', () => {
    expect(read('data: YHOO\ndata: +2\ndata: 10\n\n')).toEqual([{ name: 'message', data: 'YHOO\n+2\n10' }]);
    expect(read('event: add\ndata: 73857293\n\n')).toEqual([{ name: 'add', data: '73857293' }]);
  });

  it('drops comments, one leading space and events without data', () => {
    expect(
      read(': test stream\n\ndata: first event\nid: 1\n\ndata:second event\nid\n\ndata:  third event\n\n'),
    ).toEqual([
      { name: 'message', data: 'first event' },
      { name: 'message', data: 'second event' },
      { name: 'message', data: ' third event' },
    ]);
    expect(read('event: nothing\n\n')).toEqual([]);
    expect(read('data\n\ndata\ndata\n\ndata:')).toEqual([
      { name: 'message', data: '' },
      { name: 'message', data: '\n' },
    ]);
  });

  it('takes pieces cut anywhere and every kind of line end', () => {
    const text = '\uFEFFevent: measurement\r\ndata: {"a":1}\r\n\r\ndata: x\r\r';
    const whole = [
      { name: 'measurement', data: '{"a":1}' },
      { name: 'message', data: 'x' },
    ];
    expect(read(text, 'event: next\n')).toEqual(whole);
    expect(read(...text, 'event: next\n')).toEqual(whole);
  });
});
