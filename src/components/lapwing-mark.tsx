/** The mark: three nested bowed bands. */
export function LapwingMark({ sizePx = 22 }: { sizePx?: number }) {
  return (
    <svg
      aria-hidden="true"
      width={sizePx}
      height={sizePx}
      viewBox="0 0 24 24"
      fill="none"
      stroke="currentColor"
      strokeWidth="2.1"
      strokeLinecap="round"
    >
      <path d="M1.5 20C2.5 9 6.500 3.500 12 3.500S21.500 9 22.500 20" />
      <path d="M6.200 20C6.800 13.200 8.700 9.200 12 9.200s5.200 4 5.800 10.800" />
      <path d="M10.300 20c.2-3.300.7-5 1.700-5s1.500 1.700 1.700 5" />
    </svg>
  )
}
