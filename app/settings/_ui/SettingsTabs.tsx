import Link from 'next/link'

const tabs = [
  { href: '/settings', label: 'Works' },
  { href: '/settings/people', label: 'People' },
  { href: '/settings/password', label: 'Your password' },
] as const

export function SettingsTabs({ current }: { readonly current: (typeof tabs)[number]['href'] }) {
  return (
    <nav className="tabs" aria-label="Settings">
      {tabs.map(({ href, label }) => (
        <Link key={href} href={href} prefetch={false} aria-current={href === current ? 'page' : undefined}>
          {label}
        </Link>
      ))}
    </nav>
  )
}
