import { View } from '@react-pdf/renderer'
import type { ReactNode } from 'react'
import { planningCaution } from '@/lib/advance/cautions'
import type { PackContact, PackDocument, PackShow } from '@/lib/advance/pack-document'
import { ink } from '../ink'
import { mm } from '../paper-measure'
import { Figures, Heading, Plain } from '../words'
import { FactList } from './fact-list'
import { LinkCode } from './link-code'
import { PageFrame } from './page-frame'

/** For whom, of which show or shows, which revision, what changed, by when, and the way to answer. */
export function CoverPage({ pack, replyLink }: { pack: PackDocument; replyLink: string | null }) {
  return (
    <PageFrame pack={pack} title="Pack">
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', marginTop: mm(4), marginBottom: mm(6) }}>
        <View style={{ flex: 1, paddingRight: mm(8) }}>
          <Plain colour="soft">{pack.audience === 'venue' ? 'What we ask of' : 'What we would hire from'}</Plain>
          <Heading size={30}>{pack.recipient.name}</Heading>
          {pack.recipient.place !== '' && <Plain size={11}>{pack.recipient.place}</Plain>}
          <View style={{ marginTop: mm(5) }}>
            <Heading size={15}>{`Revision ${pack.revision.number}, ${pack.rig}`}</Heading>
            <Plain>{`issued ${pack.revision.issued}: ${pack.revision.note}`}</Plain>
          </View>
          {pack.answersDue && (
            <View style={{ marginTop: mm(4), borderLeft: `3pt solid ${ink.ink}`, paddingLeft: 6 }}>
              <Plain size={8.5} colour="soft">
                Please answer by
              </Plain>
              <Heading size={13}>{pack.answersDue}</Heading>
            </View>
          )}
        </View>
        <LinkCode link={replyLink} words="Answer line by line here, on any phone; no account needed" sizeMm={42} />
      </View>
      <Section title={pack.shows.length === 1 ? 'Show' : `${pack.shows.length} shows`}>
        {pack.shows.map((show) => (
          <ShowRow key={show.showId} show={show} />
        ))}
      </Section>
      {pack.facts.length > 0 && (
        <Section title={pack.audience === 'venue' ? 'Stage and player' : 'Delivery and collection'}>
          <FactList facts={pack.facts} />
        </Section>
      )}
      <ChangedSection pack={pack} />
      {pack.contacts.length > 0 && (
        <Section title="Contacts">
          {pack.contacts.map((contact, index) => (
            <ContactRow key={index} contact={contact} />
          ))}
        </Section>
      )}
      <Plain size={8} colour="soft" style={{ marginTop: mm(4) }}>
        {planningCaution}
      </Plain>
    </PageFrame>
  )
}

function ChangedSection({ pack: { changed } }: { pack: PackDocument }) {
  if (!changed) return null
  return (
    <Section title={`Changed since revision ${changed.sinceRevision}`}>
      {changed.sentences.length === 0 && <Plain>Nothing that concerns you.</Plain>}
      {changed.sentences.map((sentence, index) => (
        <View key={index} wrap={false} style={{ flexDirection: 'row', paddingVertical: 1 }}>
          <Plain style={{ width: mm(5) }}>–</Plain>
          <View style={{ flex: 1 }}>
            <Plain>{sentence}</Plain>
          </View>
        </View>
      ))}
    </Section>
  )
}

function Section({ title, children }: { title: string; children: ReactNode }) {
  return (
    <View style={{ marginBottom: mm(4) }}>
      <View
        minPresenceAhead={40}
        style={{ borderBottom: `0.75pt solid ${ink.ink}`, paddingBottom: 1, marginBottom: 2 }}
      >
        <Heading size={12}>{title}</Heading>
      </View>
      {children}
    </View>
  )
}

function ShowRow({ show }: { show: PackShow }) {
  return (
    <View wrap={false} style={{ flexDirection: 'row', paddingVertical: 2.5, borderBottom: `0.4pt solid ${ink.line}` }}>
      <View style={{ width: mm(34) }}>
        <Figures bold>{show.date}</Figures>
      </View>
      <View style={{ flex: 1 }}>
        <Plain bold>{show.title}</Plain>
        {show.times.map(({ label, words }) => (
          <Plain key={label} size={8.5}>{`${label}: ${words}`}</Plain>
        ))}
      </View>
    </View>
  )
}

function ContactRow({ contact }: { contact: PackContact }) {
  return (
    <View wrap={false} style={{ flexDirection: 'row', paddingVertical: 2, borderBottom: `0.4pt solid ${ink.line}` }}>
      <View style={{ width: mm(48) }}>
        <Plain bold>{contact.name}</Plain>
      </View>
      <View style={{ width: mm(46) }}>
        <Plain colour="soft">{contact.duty}</Plain>
      </View>
      <View style={{ flex: 1 }}>
        <Plain>{[contact.email, contact.phone].filter(Boolean).join(', ')}</Plain>
      </View>
    </View>
  )
}
