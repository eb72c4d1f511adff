// The moment of printing, as it stands in the record.

/** `2027-03-02 14:05`, in the time of the place. */
export function momentText(now: Date): string {
  const two = (number: number): string => String(number).padStart(2, '0');
  const day = [now.getFullYear(), two(now.getMonth() + 1), two(now.getDate())].join('-');
  return `${day} ${two(now.getHours())}:${two(now.getMinutes())}`;
}
