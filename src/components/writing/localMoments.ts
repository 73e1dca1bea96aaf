/** Tells the moments of the page by the reader's own clock. Without it they stand in UTC, and say so. */
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const two = (n: number) => String(n).padStart(2, '0');

for (const element of document.querySelectorAll<HTMLTimeElement>('time[data-moment]')) {
  const at = new Date(element.dateTime);
  if (Number.isNaN(at.getTime())) continue;
  const day = `${at.getDate()} ${MONTHS[at.getMonth()] ?? ''} ${at.getFullYear()}`;
  element.textContent = `${day}, ${two(at.getHours())}:${two(at.getMinutes())}`;
}
