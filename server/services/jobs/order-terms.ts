import type { Transaction } from 'sequelize'
import type { MethodOffer as Offer, Site as OfferedSite } from '../../../shared/api/evaluations.ts'
import type { Order } from '../../../shared/api/orders.ts'
import type { Currency } from '../../../shared/api/words.ts'
import { priceOf, type Price } from '../../../shared/orders/price-of.ts'
import { sitesFor } from '../../../shared/orders/sites-for.ts'
import { wordsFor } from '../../../shared/orders/words-for.ts'
import { Problem } from '../../../shared/problems.ts'
import { Company } from '../../models/people/company.ts'
import { Customer } from '../../models/people/customer.ts'
import { MethodOffer } from '../../models/sites/method-offer.ts'
import { Site } from '../../models/sites/site.ts'

/** What an order of a customer is priced and placed by. Only offers in the customer's currency count. */
export type OrderTerms = { currency: Currency; taxPercent: number; offers: Offer[]; sites: OfferedSite[] }

export async function orderTerms(customerId: string, tx?: Transaction): Promise<OrderTerms> {
  const company = await Company.findOne({ raw: true, transaction: tx })
  const customer = await Customer.findByPk(customerId, { raw: true, transaction: tx })
  if (!company || !customer) throw new Problem('unavailable', 'the lab has not set up its prices yet')
  const offers = await MethodOffer.findAll({ where: { currency: customer.currency }, order: [['methodId', 'ASC']], raw: true, transaction: tx })
  const sites = await Site.findAll({ order: [['name', 'ASC']], raw: true, transaction: tx })
  return { currency: customer.currency, taxPercent: company.taxPercent, offers, sites }
}

/** What a job's row says of its order: content in words, prices and, unless the client chose one, the first site that does all of it. */
export function columnsOf(order: Order, { currency, taxPercent, offers, sites }: OrderTerms) {
  const { lines, netMinor, taxMinor, totalMinor }: Price = priceOf(order, offers, taxPercent)
  const siteId = order.siteId ?? sitesFor(order, offers, sites)[0]?.siteId
  if (!siteId || !sites.some(({ id }) => id === siteId)) throw new Problem('not-acceptable', 'the lab has no such site', { 'order.siteId': 'choose one of the sites offered' })
  return { order, siteId, lines, netMinor, taxMinor, totalMinor, currency, purchaseOrder: order.purchaseOrder, neededBy: order.neededBy, ...wordsFor(order) }
}
