import Link from 'next/link'

const tabs = [
  { href: '/catalogue', label: 'Products' },
  { href: '/catalogue/materials', label: 'Materials' },
] as const

export function CatalogueTabs({ current }: { readonly current: (typeof tabs)[number]['href'] }) {
  return (
    <nav className="tabs" aria-label="Catalogue">
      {tabs.map(({ href, label }) => (
        <Link key={href} href={href} prefetch={false} aria-current={href === current ? 'page' : undefined}>
          {label}
        </Link>
      ))}
    </nav>
  )
}
