import { customerPageSchema, customerViewSchema } from '@shared/customers';
import { machinePageSchema, machineViewSchema } from '@shared/machines';
import { queryOptions } from '@tanstack/react-query';
import { http } from './http.js';

export const customerKeys = { all: ['customers'] as const, one: (id: string) => ['customers', id] as const };
export const machineKeys = { all: ['machines'] as const, one: (id: string) => ['machines', id] as const };

const list = (params: Record<string, string | undefined>): string => {
  const given = Object.entries(params).filter((entry): entry is [string, string] => entry[1] !== undefined && entry[1] !== '');
  return given.length === 0 ? '' : `?${new URLSearchParams(given)}`;
};

export const customersQuery = (params: { q?: string; page?: string; size?: string }) =>
  queryOptions({
    queryKey: [...customerKeys.all, 'page', params],
    queryFn: ({ signal }) => http.get(`/customers${list(params)}`, customerPageSchema, { signal }),
    placeholderData: (old) => old,
  });
export const customerQuery = (id: string) => queryOptions({ queryKey: customerKeys.one(id), queryFn: ({ signal }) => http.get(`/customers/${id}`, customerViewSchema, { signal }) });

export const machinesQuery = (params: { q?: string; customerId?: string; page?: string; size?: string }) =>
  queryOptions({
    queryKey: [...machineKeys.all, 'page', params],
    queryFn: ({ signal }) => http.get(`/machines${list(params)}`, machinePageSchema, { signal }),
    placeholderData: (old) => old,
  });
export const machineQuery = (id: string) => queryOptions({ queryKey: machineKeys.one(id), queryFn: ({ signal }) => http.get(`/machines/${id}`, machineViewSchema, { signal }) });
