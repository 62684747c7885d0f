import { Body, Controller, Get, Param, Post, Put, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import {
  createCustomerSchema,
  customerQuerySchema,
  customerTermsSchema,
  updateCustomerSchema,
  type CreateCustomer,
  type CustomerPage,
  type CustomerQuery,
  type CustomerTerms,
  type CustomerView,
  type UpdateCustomer,
} from '@shared/customers';
import { idField } from '@shared/fields';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { CustomersService } from './customers.service.js';

@ApiTags('customers')
@Controller('customers')
export class CustomersController {
  constructor(private readonly customers: CustomersService) {}

  @Get()
  @Needs('customers.read')
  page(@Query({ schema: customerQuerySchema }) query: CustomerQuery): Promise<CustomerPage> {
    return this.customers.page(query);
  }

  @Get(':id')
  @Needs('customers.read')
  one(@Param('id', { schema: idField }) id: string): Promise<CustomerView> {
    return this.customers.one(id);
  }

  @Post()
  @Needs('customers.edit')
  create(@CurrentActor() actor: Actor, @Body({ schema: createCustomerSchema }) input: CreateCustomer): Promise<CustomerView> {
    return this.customers.create(actor, input);
  }

  @Put(':id')
  @Needs('customers.edit')
  update(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: updateCustomerSchema }) input: UpdateCustomer): Promise<CustomerView> {
    return this.customers.update(actor, id, input);
  }

  @Put(':id/terms')
  @Needs('customers.terms')
  setTerms(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: customerTermsSchema }) input: CustomerTerms): Promise<CustomerView> {
    return this.customers.setTerms(actor, id, input);
  }
}
