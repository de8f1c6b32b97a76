import { copiesOf } from '@shared/geometry/shape'
import type { Marks } from '@shared/schemas/marks'
import type { Photo } from '@shared/schemas/readings'
import type { Shape } from '@shared/schemas/shapes'
import { type MouseEvent, useId } from 'react'

export interface PhotoPin {
  key: string
  number: number
  x: number
  y: number
  label: string
  isOpen: boolean
  isChosen: boolean
}

interface Props {
  photo: Pick<Photo, 'sha256' | 'widthPx' | 'heightPx'>
  marks: Marks
  alt: string
  showMarks: boolean
  /** Distance of each click from its fitted band, px, by trace; drawn instead of the traces. */
  residuals?: ReadonlyMap<string, readonly number[]>
  /** The residual that is drawn darkest, px. */
  residualScalePx?: number
  pins?: readonly PhotoPin[]
  onChoosePin?: (key: string) => void
  /** A place of the photograph was clicked, photo pixels. */
  onPlace?: (x: number, y: number) => void
}

/** A photograph with what was marked on it; drawn, not edited. */
export function MarkedPhoto({ photo, marks, alt, showMarks, residuals, pins = [], ...rest }: Props) {
  const { widthPx, heightPx, sha256 } = photo
  const unit = widthPx / 700
  const { onPlace } = rest
  const place = (event: MouseEvent<SVGSVGElement>) => {
    const box = event.currentTarget.getBoundingClientRect()
    const x = ((event.clientX - box.left) / box.width) * widthPx
    const y = ((event.clientY - box.top) / box.height) * heightPx
    onPlace?.(Math.round(x), Math.round(y))
  }
  return (
    <div className="relative" style={{ aspectRatio: `${widthPx} / ${heightPx}` }}>
      <img
        src={`/api/photos/${sha256}/preview?width=1280`}
        alt={alt}
        className="absolute inset-0 h-full w-full bg-step-active"
      />
      {/* biome-ignore lint/a11y/useKeyWithClickEvents: by keyboard a remark goes on the whole, by its own button */}
      <svg
        viewBox={`0 0 ${widthPx} ${heightPx}`}
        className="absolute inset-0 h-full w-full"
        style={{ cursor: onPlace ? 'crosshair' : undefined }}
        onClick={onPlace && place}
      >
        <title>{alt}</title>
        {showMarks && <MarkLines marks={marks} unit={unit} withTraces={!residuals} />}
        {residuals && (
          <ResidualDots marks={marks} residuals={residuals} unit={unit} scalePx={rest.residualScalePx ?? 2} />
        )}
        {pins.map((pin) => (
          <Pin key={pin.key} pin={pin} unit={unit} onChoose={rest.onChoosePin} />
        ))}
      </svg>
    </div>
  )
}

function MarkLines({ marks, unit, withTraces }: { marks: Marks; unit: number; withTraces: boolean }) {
  const hatchId = useId()
  const { outline, leaveOuts, pressArrow, datumMarks, traces } = marks
  return (
    <g fill="none" strokeLinecap="round" strokeLinejoin="round">
      <defs>
        <pattern id={hatchId} width={5 * unit} height={5 * unit} patternUnits="userSpaceOnUse">
          <path
            d={`M0 ${5 * unit}L${5 * unit} 0`}
            stroke="#ffffff"
            strokeOpacity={0.55}
            strokeWidth={unit * 0.8}
          />
        </pattern>
      </defs>
      {outline && <CasedShape shape={outline} unit={unit} />}
      {leaveOuts.flatMap((leaveOut) =>
        copiesOf(leaveOut).map((shape, i) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: copies have no name, and the list never changes
          <CasedShape key={`${leaveOut.id}-${i}`} shape={shape} unit={unit} fill={`url(#${hatchId})`} />
        )),
      )}
      {withTraces &&
        traces.map(({ id, points }) => (
          <path key={id} d={pathOf(points)} stroke="#ffffff" strokeOpacity={0.8} strokeWidth={unit * 0.8} />
        ))}
      {datumMarks.map(({ id, x, y }) => (
        <path
          key={id}
          d={`M${x - 6 * unit} ${y}H${x + 6 * unit}M${x} ${y - 6 * unit}V${y + 6 * unit}`}
          stroke="#ffffff"
          strokeWidth={unit * 1.5}
        />
      ))}
      {pressArrow && <Arrow arrow={pressArrow} unit={unit} />}
    </g>
  )
}

function CasedShape({ shape, unit, fill = 'none' }: { shape: Shape; unit: number; fill?: string }) {
  const d = shapePath(shape)
  return (
    <>
      <path d={d} stroke="#10211b" strokeOpacity={0.7} strokeWidth={unit * 2.6} />
      <path d={d} fill={fill} stroke="#ffffff" strokeWidth={unit * 1.2} />
    </>
  )
}

function Arrow({ arrow, unit }: { arrow: NonNullable<Marks['pressArrow']>; unit: number }) {
  const length = Math.hypot(arrow.dx, arrow.dy) || 1
  const [ux, uy] = [arrow.dx / length, arrow.dy / length]
  const reach = 46 * unit
  const [tipX, tipY] = [arrow.x + ux * reach, arrow.y + uy * reach]
  const wing = (side: 1 | -1) =>
    `${tipX - 9 * unit * ux + side * 5 * unit * uy} ${tipY - 9 * unit * uy - side * 5 * unit * ux}`
  const d = `M${arrow.x} ${arrow.y}L${tipX} ${tipY}M${wing(1)}L${tipX} ${tipY}L${wing(-1)}`
  return (
    <>
      <path d={d} stroke="#10211b" strokeOpacity={0.8} strokeWidth={unit * 4} />
      <path d={d} stroke="#ffffff" strokeWidth={unit * 1.8} />
      <circle
        cx={arrow.x}
        cy={arrow.y}
        r={unit * 3.5}
        fill="#10211b"
        stroke="#ffffff"
        strokeWidth={unit * 1.4}
      />
    </>
  )
}

interface ResidualProps {
  marks: Marks
  residuals: ReadonlyMap<string, readonly number[]>
  unit: number
  scalePx: number
}

/** Pale where a click lies on its band, chestnut where it lies off. */
function ResidualDots({ marks, residuals, unit, scalePx }: ResidualProps) {
  return (
    <g>
      {marks.traces.flatMap(({ id, points }) =>
        points.map(([x, y], i) => {
          const off = Math.min(1, Math.abs(residuals.get(id)?.[i] ?? 0) / scalePx)
          return (
            <circle
              // biome-ignore lint/suspicious/noArrayIndexKey: clicks have no name, and the list never changes
              key={`${id}-${i}`}
              cx={x}
              cy={y}
              r={unit * (1.6 + 2.6 * off)}
              fill={`color-mix(in srgb, #ff9a55 ${Math.round(100 * off)}%, #f4f1e4)`}
              fillOpacity={0.45 + 0.55 * off}
            />
          )
        }),
      )}
    </g>
  )
}

interface PinProps {
  pin: PhotoPin
  unit: number
  onChoose?: (key: string) => void
}

function Pin({ pin, unit, onChoose }: PinProps) {
  const { key, number, x, y, label, isOpen, isChosen } = pin
  const r = 11 * unit
  return (
    // biome-ignore lint/a11y/useSemanticElements: an svg has no button
    <g
      role="button"
      tabIndex={0}
      aria-label={label}
      className="cursor-pointer"
      onClick={(event) => {
        event.stopPropagation()
        onChoose?.(key)
      }}
      onKeyDown={(event) => {
        if (event.key === 'Enter' || event.key === ' ') onChoose?.(key)
      }}
    >
      <circle cx={x} cy={y} r={2.2 * unit} fill="#ffffff" />
      <path d={`M${x} ${y}L${x + r} ${y - r}`} stroke="#ffffff" strokeWidth={unit * 1.4} />
      <circle
        cx={x + 1.7 * r}
        cy={y - 1.7 * r}
        r={r}
        fill={isOpen ? '#a9562b' : '#56615b'}
        stroke={isChosen ? '#cbbcff' : '#ffffff'}
        strokeWidth={unit * (isChosen ? 3 : 1.4)}
      />
      <text
        x={x + 1.7 * r}
        y={y - 1.7 * r + 4.6 * unit}
        textAnchor="middle"
        fontSize={13 * unit}
        fontWeight={600}
        fill="#ffffff"
      >
        {number}
      </text>
    </g>
  )
}

function shapePath(shape: Shape): string {
  switch (shape.kind) {
    case 'circle':
      return ellipsePath(shape.cx, shape.cy, shape.r, shape.r, 0)
    case 'ellipse':
      return ellipsePath(shape.cx, shape.cy, shape.rx, shape.ry, shape.rotationDeg)
    case 'polygon':
      return `${pathOf(shape.points)}Z`
  }
}

function ellipsePath(cx: number, cy: number, rx: number, ry: number, rotationDeg: number): string {
  const turn = (rotationDeg * Math.PI) / 180
  const [dx, dy] = [rx * Math.cos(turn), rx * Math.sin(turn)]
  const arc = (x: number, y: number) => `A${rx} ${ry} ${rotationDeg} 0 1 ${x} ${y}`
  return `M${cx - dx} ${cy - dy}${arc(cx + dx, cy + dy)}${arc(cx - dx, cy - dy)}Z`
}

function pathOf(points: readonly (readonly [number, number])[]): string {
  return points.map(([x, y], i) => `${i === 0 ? 'M' : 'L'}${x} ${y}`).join('')
}
