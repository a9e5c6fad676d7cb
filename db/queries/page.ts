import { PAGE_SIZE } from '@/shared/api/fields'

export type PageRequest = Readonly<{ offset: number; search: string }>
export type Page<Item> = Readonly<{ items: Item[]; total: number; nextOffset: number | null }>

export const pageFrom = <Item>(items: Item[], total: number, offset: number): Page<Item> => ({
  items,
  total,
  nextOffset: offset + items.length < total && items.length > 0 ? offset + PAGE_SIZE : null,
})
