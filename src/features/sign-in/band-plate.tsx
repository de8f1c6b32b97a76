const bands = Array.from({ length: 15 }, (_, i) => i - 7)

/** A face under a flat, drawn in hairlines: bowed bands over a disc. Ornament only. */
export function BandPlate() {
  return (
    <div
      aria-hidden="true"
      className="hidden items-center justify-center border-hairline border-l bg-field desk:flex"
    >
      <svg
        aria-hidden="true"
        viewBox="-110 -110 220 220"
        className="w-[62%] max-w-[34rem]"
        fill="none"
        stroke="var(--bottle)"
      >
        <defs>
          <clipPath id="band-plate">
            <circle r="96" />
          </clipPath>
        </defs>
        <g clipPath="url(#band-plate)">
          {bands.map((i) => (
            <path
              key={i}
              d={`M-110 ${i * 14 + 12}C-50 ${i * 14 - 12} 50 ${i * 14 - 12} 110 ${i * 14 + 12}`}
              strokeWidth="5.5"
              strokeOpacity={0.22 + 0.05 * ((i + 7) % 3)}
            />
          ))}
        </g>
        <circle r="96" stroke="var(--ink)" strokeWidth="0.75" />
        <circle r="104" stroke="var(--hairline)" strokeWidth="0.75" />
      </svg>
    </div>
  )
}
