/** The frame of every signed-in page: header, banners, the page, the line on safety. */
import { Link, NavLink, Outlet } from 'react-router-dom'
import { AccountMenu } from '#client/app/account-menu.tsx'
import { DemoBanner, OfflineBanner } from '#client/app/banners.tsx'
import { WaveMark } from '#client/components/wave-mark.tsx'
import { SignedOutDialog } from '#client/features/session/components/signed-out-dialog.tsx'

const places = [
  { to: '/designs', name: 'Designs' },
  { to: '/runs', name: 'Runs' },
]

const placeClasses =
  'relative flex h-full items-center px-2.5 text-soft no-underline hover:text-ink aria-[current=page]:font-medium aria-[current=page]:text-ink aria-[current=page]:after:absolute aria-[current=page]:after:inset-x-2.5 aria-[current=page]:after:-bottom-px aria-[current=page]:after:h-0.5 aria-[current=page]:after:bg-copper'

export function Shell() {
  return (
    <div className="flex min-h-dvh flex-col">
      <a
        href="#page"
        className="absolute top-2 left-4 z-60 -translate-y-20 rounded-md bg-petrol px-3 py-2 text-on-petrol focus:translate-y-0"
      >
        Skip to the page
      </a>
      <header className="bg-card">
        <div className="gutter flex h-13 items-stretch gap-2 border-b border-line sm:gap-6">
          <Link
            to="/designs"
            aria-label="Sinewright, to the designs"
            className="flex items-center gap-2.5 text-lg font-semibold text-ink no-underline"
          >
            <WaveMark className="w-8 text-petrol" />
            <span className="max-sm:sr-only">Sinewright</span>
          </Link>
          <nav aria-label="Main" className="flex items-stretch gap-0.5">
            {places.map((place) => (
              <NavLink key={place.to} to={place.to} className={placeClasses}>
                {place.name}
              </NavLink>
            ))}
          </nav>
          <div className="ml-auto flex items-center">
            <AccountMenu />
          </div>
        </div>
        <DemoBanner />
      </header>
      <OfflineBanner />
      <main id="page" tabIndex={-1} className="gutter w-full grow pb-10">
        <Outlet />
      </main>
      <footer className="gutter pb-5 text-sm text-soft">
        <p className="border-t border-hair pt-3">
          Simulation does not replace measurement. Mains-derived supplies and hot filaments can hurt: follow
          local codes and licensed practice.
        </p>
      </footer>
      <SignedOutDialog />
    </div>
  )
}
