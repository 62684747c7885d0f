import { outboxListSchema } from '@shared/messages';
import { userViewSchema, type CreateUser, type UpdateUser } from '@shared/session';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { z } from 'zod';
import { http, newKey } from '../../../lib/http.js';

export const shopKeys = { users: ['users'] as const, messages: ['messages'] as const };

export const usersQuery = queryOptions({ queryKey: shopKeys.users, queryFn: ({ signal }) => http.get('/users', z.array(userViewSchema), { signal }) });
export const messagesQuery = queryOptions({ queryKey: shopKeys.messages, queryFn: ({ signal }) => http.get('/messages', outboxListSchema, { signal }) });

export function useCreateUser() {
  const client = useQueryClient();
  const [idempotencyKey, setKey] = useState(newKey);
  return useMutation({
    mutationFn: (input: CreateUser) => http.post('/users', input, userViewSchema, { idempotencyKey }),
    onSettled: () => {
      setKey(newKey());
      return client.invalidateQueries({ queryKey: shopKeys.users });
    },
  });
}

export function useUpdateUser(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: UpdateUser) => http.put(`/users/${id}`, input, userViewSchema),
    onSuccess: () => client.invalidateQueries({ queryKey: shopKeys.users }),
  });
}
