import type { PrismaClient } from '../generated/client'
import type { SettingRecords } from '../types'

export function settingRecords(client: PrismaClient): SettingRecords {
  return {
    async get(key) {
      const setting = await client.setting.findUnique({ where: { key } })
      return setting?.value ?? null
    },

    async set(key, value) {
      await client.setting.upsert({ where: { key }, create: { key, value }, update: { value } })
    },

    async remove(key) {
      await client.setting.deleteMany({ where: { key } })
    },
  }
}
