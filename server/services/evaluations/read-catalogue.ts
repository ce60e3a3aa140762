import type { MethodOffer as Offer, Site as OfferedSite } from '../../../shared/api/evaluations.ts'
import type { Caller } from '../../caller.ts'
import { MethodOffer } from '../../models/sites/method-offer.ts'
import { Site } from '../../models/sites/site.ts'
import { orderTerms } from '../jobs/order-terms.ts'

/** What can be ordered, at what price and where; a customer sees the prices in its own currency only. */
export async function readCatalogue(caller: Caller): Promise<{ offers: Offer[]; sites: OfferedSite[] }> {
  const { customerId } = caller.person
  if (customerId) {
    const { offers, sites } = await orderTerms(customerId)
    return { offers, sites }
  }
  return { offers: await MethodOffer.findAll({ order: [['methodId', 'ASC']], raw: true }), sites: await Site.findAll({ order: [['name', 'ASC']], raw: true }) }
}
