import { cva, type VariantProps } from 'class-variance-authority'
import { Slot } from 'radix-ui'
import type { ComponentProps } from 'react'
import { classNames } from '@/lib/class-names'
import { KeyCap } from './key-cap'

const look = cva(
  'inline-flex h-[34px] shrink-0 items-center justify-center gap-2.5 whitespace-nowrap rounded px-3.5 text-body font-semibold no-underline disabled:opacity-55 max-desk:h-10 max-desk:[&]:relative max-desk:before:absolute max-desk:before:-inset-y-0.5 max-desk:before:inset-x-0',
  {
    variants: {
      kind: {
        /** One a page: what the page is for. */
        main: 'bg-ink text-on-ink hover:bg-ink/90',
        plain: 'border border-edge bg-transparent text-ink hover:border-ink',
        /** Needs a person's second thought. */
        grave: 'border border-chestnut bg-transparent text-chestnut hover:bg-chestnut/8',
        quiet: 'px-0 font-normal text-ink underline decoration-edge underline-offset-3 hover:decoration-ink',
      },
    },
    defaultVariants: { kind: 'plain' },
  },
)

type Props = ComponentProps<'button'> &
  VariantProps<typeof look> & {
    /** Key that does the same, shown beside the word. */
    hotKey?: string
    /** Puts the look on the one child, for links. */
    asChild?: boolean
  }

export function Button({ kind, hotKey, asChild, className, children, type = 'button', ...rest }: Props) {
  const classes = classNames(look({ kind }), className)
  if (asChild) return <Slot.Root className={classes}>{children}</Slot.Root>
  return (
    <button type={type} className={classes} {...rest}>
      {children}
      {hotKey && <KeyCap onInk={kind === 'main'}>{hotKey}</KeyCap>}
    </button>
  )
}
