export { customersRoutes } from './customers.routes.ts';
export { addCustomer, createCustomer } from './customers.service.ts';
export { customerFor } from './known-customer.service.ts';
export type { CustomerFields } from './customers.service.ts';
