/** American dates and times of an instant (ISO 8601) in the inspection's time zone, with the zone's abbreviation. */
export function dayIn(timeZone: string, instant: string): string {
  return print(instant, { timeZone, weekday: 'long', month: 'long', day: 'numeric', year: 'numeric' });
}

export function dateIn(timeZone: string, instant: string): string {
  return print(instant, { timeZone, month: 'long', day: 'numeric', year: 'numeric' });
}

export function timeIn(timeZone: string, instant: string): string {
  return print(instant, { timeZone, hour: 'numeric', minute: '2-digit' });
}

export function dateTimeIn(timeZone: string, instant: string): string {
  const time = print(instant, { timeZone, hour: 'numeric', minute: '2-digit', timeZoneName: 'short' });
  return `${dateIn(timeZone, instant)}, ${time}`;
}

/** Some versions put narrow spaces between figures and words; equal instants must give equal bytes. */
function print(instant: string, options: Intl.DateTimeFormatOptions): string {
  return new Intl.DateTimeFormat('en-US', options).format(new Date(instant)).replaceAll(/[\u202f\u00a0\u2009]/g, ' ');
}
