import { NavLink, Outlet, ScrollRestoration } from 'react-router-dom';
import { Mark } from '../../components/mark.js';
import { UnitsProvider } from '../../components/units.js';
import { useMe } from '../../lib/me.js';
import { AccountMenu } from './account-menu.js';
import { homeOf, roomsOf } from './rooms.js';
import { SearchBox } from './search-box.js';
import { SignInAgain } from './sign-in-again.js';
import { t } from './text.js';
import { useTheme } from './theme.js';
import './shell.css';

/** Header with the rooms, and the open page below it. */
export function Shell() {
  const me = useMe();
  const customer = me.roles.includes('customer');
  useTheme(me.preferences.theme);
  return (
    <UnitsProvider value={me.preferences.units}>
      <div className={`lb-shell${customer ? ' lb-shell-portal' : ''}`}>
        <a className="lb-skip" href="#content">
          {t('skip')}
        </a>
        <header className="lb-header no-print">
          <NavLink to={homeOf(me)} className="lb-brand">
            <Mark size={38} />
            <span>Loopbay</span>
          </NavLink>
          <nav aria-label={t('rooms')}>
            {roomsOf(me).map((room) => (
              <NavLink key={room.path} to={room.path} end={room.path === '/portal'}>
                {room.name}
              </NavLink>
            ))}
          </nav>
          <div className="lb-header-end">
            {!customer && <SearchBox />}
            <AccountMenu />
          </div>
        </header>
        <main id="content" tabIndex={-1}>
          <Outlet />
        </main>
        <SignInAgain />
        <ScrollRestoration />
      </div>
    </UnitsProvider>
  );
}
