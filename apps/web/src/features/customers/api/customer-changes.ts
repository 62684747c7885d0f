import { customerViewSchema, type CreateCustomer, type CustomerTerms, type UpdateCustomer } from '@shared/customers';
import { machineViewSchema, type UpdateMachine } from '@shared/machines';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { customerKeys, machineKeys } from '../../../lib/customer-queries.js';
import { http, newKey } from '../../../lib/http.js';

export function useCreateCustomer() {
  const client = useQueryClient();
  const [idempotencyKey] = useState(newKey);
  return useMutation({
    mutationFn: (input: CreateCustomer) => http.post('/customers', input, customerViewSchema, { idempotencyKey }),
    onSuccess: () => client.invalidateQueries({ queryKey: customerKeys.all }),
  });
}

/** A job's sheet shows its customer too, so jobs are asked for again with it. */
function useCustomerChange<Input>(id: string, path: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: Input) => http.put(path, input, customerViewSchema),
    onSuccess: (customer) => {
      client.setQueryData(customerKeys.one(id), customer);
      return Promise.all([client.invalidateQueries({ queryKey: customerKeys.all }), client.invalidateQueries({ queryKey: ['jobs'] })]);
    },
  });
}
export const useUpdateCustomer = (id: string) => useCustomerChange<UpdateCustomer>(id, `/customers/${id}`);
export const useSetTerms = (id: string) => useCustomerChange<CustomerTerms>(id, `/customers/${id}/terms`);

export function useUpdateMachine(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (input: UpdateMachine) => http.put(`/machines/${id}`, input, machineViewSchema),
    onSuccess: (machine) => {
      client.setQueryData(machineKeys.one(id), machine);
      return Promise.all([client.invalidateQueries({ queryKey: machineKeys.all }), client.invalidateQueries({ queryKey: ['jobs'] })]);
    },
  });
}
