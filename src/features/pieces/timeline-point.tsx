import type { TimelineReading } from './timeline-readings'

interface Props {
  point: TimelineReading
  xPx: number
  yOf: (um: number) => number
}

/** A whisker of ± U with the head that the rule has for the verdict; a draft has the whisker alone. */
export function TimelinePoint({ point: { valueUm, uUm, verdict }, xPx, yOf }: Props) {
  const y = yOf(valueUm)
  const tone =
    verdict === 'conforms' ? 'var(--bottle)' : verdict === 'doesNotConform' ? 'var(--chestnut)' : 'var(--ink)'
  return (
    <g transform={`translate(${xPx} 0)`} stroke={tone} strokeWidth="1.25">
      {uUm !== null && (
        <path
          d={`M0 ${yOf(valueUm - uUm)}V${yOf(valueUm + uUm)}M-5 ${yOf(valueUm - uUm)}h10M-5 ${yOf(valueUm + uUm)}h10`}
        />
      )}
      {verdict === 'conforms' && <circle cy={y} r="4.2" fill={tone} stroke="none" />}
      {verdict === 'doesNotConform' && (
        <path d={`M0 ${y - 5}L5 ${y}L0 ${y + 5}L-5 ${y}Z`} fill={tone} stroke="none" />
      )}
      {verdict === 'neitherProven' && <circle cy={y} r="3.8" fill="var(--ground)" strokeWidth="1.5" />}
      {(verdict === null || verdict === 'noVerdict' || verdict === 'noTolerance') && (
        <path d={`M-6 ${y}h12`} strokeWidth="2" />
      )}
    </g>
  )
}
