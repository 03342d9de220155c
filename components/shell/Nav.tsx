'use client'
import Link from 'next/link'
import { usePathname } from 'next/navigation'
import { classes } from '@/components/ui/classes'

const PLACES = [
  { href: '/', name: 'Waiting for me' },
  { href: '/jobs', name: 'Jobs' },
  { href: '/profiles', name: 'Profiles' },
  { href: '/team', name: 'Team' },
]

export function Nav() {
  const path = usePathname()
  const here = (href: string) => (href === '/' ? path === '/' : path === href || path.startsWith(`${href}/`))
  return (
    <nav aria-label="Main" className="flex gap-5 max-md:order-last max-md:w-full max-md:justify-between">
      {PLACES.map(({ href, name }) => (
        <Link
          key={href}
          href={href}
          aria-current={here(href) ? 'page' : undefined}
          className={classes(
            'target inline-flex items-center whitespace-nowrap border-b-2 pt-0.5',
            here(href) ? 'border-accent text-ink' : 'border-transparent text-soft hover:text-ink',
          )}
        >
          {name}
        </Link>
      ))}
    </nav>
  )
}
