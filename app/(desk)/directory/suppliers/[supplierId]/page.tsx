import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { cache } from 'react'
import { Contacts } from '@/components/directory/contacts'
import { SupplierHeading } from '@/components/directory/supplier-heading'
import { idSchema } from '@/lib/contracts/common'
import { rolesMay } from '@/lib/contracts/permissions'
import { pageActor } from '@/lib/server/auth/page-actor'
import { pageAnswer } from '@/lib/server/auth/page-answer'
import { readSupplier } from '@/lib/server/directory/suppliers'

type Props = PageProps<'/directory/suppliers/[supplierId]'>

const supplierOf = cache(async (supplierId: string) => {
  if (!idSchema.safeParse(supplierId).success) notFound()
  return pageAnswer(readSupplier(await pageActor(), supplierId))
})

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { supplier } = await supplierOf((await params).supplierId)
  return { title: supplier.name }
}

export default async function SupplierPage({ params }: Props) {
  const { supplierId } = await params
  const actor = await pageActor()
  const { supplier, contacts } = await supplierOf(supplierId)
  const mayEdit = rolesMay(actor.roles, 'directory:edit')
  return (
    <>
      <SupplierHeading supplier={supplier} isBare={contacts.length === 0} mayEdit={mayEdit} />
      <section aria-labelledby="contacts" className="mt-8">
        <h2 id="contacts" className="text-2xl">
          Contacts
        </h2>
        <Contacts under={`/api/suppliers/${supplier.id}`} contacts={contacts} mayEdit={mayEdit} />
      </section>
    </>
  )
}
