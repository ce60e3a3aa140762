import express from 'express'
import request from 'supertest'
import { expect, it } from 'vitest'
import { addressOf } from '../../../server/http/address-of.ts'

const app = express().set('trust proxy', 'loopback').get('/', (req, res) => void res.send(addressOf(req)))
const seen = async (from: string) => (await request(app).get('/').set('X-Forwarded-For', from)).text

it('counts an IPv4 address by itself and IPv6 by its network, however it is written', async () => {
  expect(await seen('203.0.113.7')).toBe('203.0.113.7')
  expect(await seen('::ffff:203.0.113.7')).toBe('203.0.113.7')
  expect(await seen('2001:db8:1:2:3:4:5:6')).toBe('2001:db8:1:2::/64')
  expect(await seen('2001:0db8:0001:0002::9')).toBe('2001:db8:1:2::/64')
  expect(await seen('2001:db8::9')).toBe('2001:db8:0:0::/64')
})

it('believes the nearest proxy on this machine only', async () => {
  expect(await seen('10.9.9.9, 203.0.113.7')).toBe('203.0.113.7')
})
