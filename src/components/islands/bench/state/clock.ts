const time = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });
const date = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short' });

/** "12:04" for today, "3 Mar, 12:04" for another day. */
export const clock = (instant: string): string => {
  const at = new Date(instant);
  const today = new Date().toDateString() === at.toDateString();
  return today ? time.format(at) : `${date.format(at)}, ${time.format(at)}`;
};
