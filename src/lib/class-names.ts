import { type ClassValue, clsx } from 'clsx'
import { extendTailwindMerge } from 'tailwind-merge'

const merge = extendTailwindMerge({
  extend: {
    classGroups: {
      'font-size': [
        {
          text: [
            'result',
            'result-tablet',
            'title',
            'headline',
            'section',
            'figure',
            'body',
            'second',
            'axis',
            'key',
          ],
        },
      ],
    },
  },
})

/** Class names in one string; of two that set the same thing the later wins. */
export function classNames(...values: ClassValue[]): string {
  return merge(clsx(values))
}
