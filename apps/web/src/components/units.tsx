import type { UnitSystem } from '@libs/quantities';
import { createContext, useContext } from 'react';

const Units = createContext<UnitSystem>('si');
export const UnitsProvider = Units.Provider;
/** The person's own unit system; stored values are SI whatever it is. */
export const useUnits = (): UnitSystem => useContext(Units);
