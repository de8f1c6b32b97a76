import './printed-page.css'
import type { PageDescription, PageItem, PageWeight } from '@shared/schemas/page-description'
import { useId } from 'react'

type ItemOf<Kind extends PageItem['kind']> = Extract<PageItem, { kind: Kind }>

const weights: Record<PageWeight, number> = { light: 300, regular: 400, semibold: 600 }

/** A printed page on the screen, drawn from the same items as its PDF; it prints on one A4 sheet. */
export function PrintedPage({ page }: { page: PageDescription }) {
  const id = useId()
  return (
    <svg
      role="img"
      aria-labelledby={`${id}title`}
      className="printed-page"
      viewBox={`0 0 ${page.widthPt} ${page.heightPt}`}
      fontFamily='"Source Sans 3", sans-serif'
    >
      <title id={`${id}title`}>{page.title}</title>
      <rect width={page.widthPt} height={page.heightPt} fill="#ffffff" />
      {page.items.map((item, i) => (
        // biome-ignore lint/suspicious/noArrayIndexKey: a page's items never change their order
        <Item key={i} item={item} clipId={`${id}clip${i}`} />
      ))}
    </svg>
  )
}

function Item({ item, clipId }: { item: PageItem; clipId: string }) {
  switch (item.kind) {
    case 'text':
      return <TextItem item={item} />
    case 'path':
      return (
        <>
          <Clip id={clipId} d={item.clip} />
          <PathItem item={item} clipId={clipId} />
        </>
      )
    case 'image':
      return (
        <>
          <Clip id={clipId} d={item.clip} />
          <ImageItem item={item} clipId={clipId} />
        </>
      )
  }
}

function Clip({ id, d }: { id: string; d: string | null }) {
  if (d === null) return null
  return (
    <clipPath id={id}>
      <path d={d} />
    </clipPath>
  )
}

function clipOf(clip: string | null, id: string): string | undefined {
  return clip === null ? undefined : `url(#${id})`
}

function TextItem({ item }: { item: ItemOf<'text'> }) {
  return (
    <text
      x={item.x}
      y={item.y}
      fontSize={item.sizePt}
      fontWeight={weights[item.weight]}
      fill={item.colour}
      textAnchor={item.anchor}
    >
      {item.text}
    </text>
  )
}

function PathItem({ item, clipId }: { item: ItemOf<'path'>; clipId: string }) {
  return (
    <path
      d={item.d}
      fill={item.fill ?? 'none'}
      fillRule={item.evenOdd ? 'evenodd' : undefined}
      stroke={item.stroke?.colour}
      strokeWidth={item.stroke?.widthPt}
      strokeDasharray={item.stroke?.dashPt?.join(' ')}
      // Of fill and stroke each, as in the PDF.
      fillOpacity={item.opacity < 1 ? item.opacity : undefined}
      strokeOpacity={item.opacity < 1 ? item.opacity : undefined}
      clipPath={clipOf(item.clip, clipId)}
    />
  )
}

function ImageItem({ item, clipId }: { item: ItemOf<'image'>; clipId: string }) {
  return (
    <image
      href={item.source}
      x={item.x}
      y={item.y}
      width={item.widthPt}
      height={item.heightPt}
      preserveAspectRatio="none"
      clipPath={clipOf(item.clip, clipId)}
    >
      <title>{item.alt}</title>
    </image>
  )
}
