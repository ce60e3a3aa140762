import { randomUUID } from 'node:crypto'
import { Customer } from '../../../server/models/people/customer.ts'

export async function buildCustomer(wanted: Partial<Pick<Customer, 'name' | 'currency'>> = {}): Promise<Customer> {
  const mark = randomUUID().slice(0, 8)
  const { name = `Forge ${mark}`, currency = 'GBP' } = wanted
  return (await Customer.create({ name, currency, address: '4 Mill Lane, Brackwater', reportEmail: `reports.${mark}@customers.example` })).get({ plain: true })
}
