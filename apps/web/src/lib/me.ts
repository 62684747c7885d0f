import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Permission } from '@shared/roles';
import { meSchema, type Me, type Preferences, type SignIn } from '@shared/session';
import { setShopZone } from './format.js';
import { http } from './http.js';

export const meQuery = queryOptions({
  queryKey: ['me'],
  queryFn: async () => {
    const me = await http.get('/session', meSchema);
    setShopZone(me.shop.timeZone);
    return me;
  },
  staleTime: 60_000,
});

/** Who is signed in; inside the shell there always is somebody. */
export function useMe(): Me {
  const { data } = useQuery(meQuery);
  if (!data) throw new Error('useMe outside the signed-in part');
  return data;
}
export const useMay = (permission: Permission): boolean => useMe().permissions.includes(permission);

export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: SignIn) => http.post('/session', input, meSchema),
    onSuccess: (me) => {
      setShopZone(me.shop.timeZone);
      client.setQueryData(meQuery.queryKey, me);
    },
  });
}

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({ mutationFn: () => http.send('POST', '/session/end'), onSettled: () => client.clear() });
}

export function useSetPreferences() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (preferences: Preferences) => http.put('/session/preferences', preferences, meSchema),
    onSuccess: (me) => client.setQueryData(meQuery.queryKey, me),
  });
}
