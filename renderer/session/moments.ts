/** A moment as a person tells it: the hour for today, the day before it for others. @param iso ISO 8601, UTC */
export function momentText(iso: string, now = new Date()): string {
  const moment = new Date(iso);
  const hour = moment.toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' });
  if (moment.toDateString() === now.toDateString()) return `today, ${hour}`;
  const year = moment.getFullYear() === now.getFullYear() ? {} : { year: 'numeric' as const };
  return `${moment.toLocaleDateString('en-GB', { day: 'numeric', month: 'long', ...year })}, ${hour}`;
}
