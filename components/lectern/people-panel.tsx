import { useState } from 'react'
import { View } from 'react-native'
import { space, TOUCH_TARGET_PX, useTheme } from '@/components/theme'
import { Button, Dialog, Heading, Lozenge, Name, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { PresentMember } from '@/shared/wire/rooms'

/** Who is in the room: raised hands first. Names are the teacher's to see. */
export function PeoplePanel({
  people,
  onLower,
  onRemove,
}: Readonly<{
  /** Null until they are known. */
  people: readonly PresentMember[] | null
  onLower: (memberId: string) => void
  onRemove: (memberId: string) => void
}>) {
  const words = useWords()
  const { colors } = useTheme()
  const [removing, setRemoving] = useState<PresentMember | null>(null)
  const { people: sayings } = words.lectern
  return (
    <View style={{ gap: space.small }}>
      <Heading level={2} kind="text">
        {sayings.title}
      </Heading>
      {people?.length === 0 ? (
        <Txt kind="note" tone="lead">
          {sayings.none}
        </Txt>
      ) : null}
      <View role="list" aria-label={sayings.title}>
        {people?.map((person) => (
          <View
            key={person.memberId}
            role="listitem"
            style={{
              minHeight: TOUCH_TARGET_PX,
              flexDirection: 'row',
              alignItems: 'center',
              gap: space.small,
              borderBottomWidth: 1,
              borderColor: colors.hairline,
            }}
          >
            <Lozenge
              kind={person.hand ? 'filled' : 'hollow'}
              tone={person.hand ? 'verdigris' : person.isOnline ? 'azurite' : 'lead'}
              sizePx={11}
            />
            <View style={{ flex: 1, minWidth: 0 }}>
              <Txt kind="note" lines={3} tone={person.isOnline ? 'lampblack' : 'lead'}>
                <Name>{person.name}</Name>
              </Txt>
              {person.hand || !person.isOnline || person.role !== 'student' ? (
                <Txt kind="small" tone={person.hand ? 'verdigris' : 'lead'}>
                  {[
                    person.hand ? sayings.handUp : null,
                    person.role === 'student' ? null : sayings.roles[person.role],
                    person.isOnline ? null : sayings.away,
                  ]
                    .filter(Boolean)
                    .join(' · ')}
                </Txt>
              ) : null}
            </View>
            <View style={{ alignSelf: 'center' }}>
              {person.hand ? (
                <Button
                  kind="quiet"
                  label={sayings.lower}
                  hint={sayings.lowerSpoken(person.name)}
                  onPress={() => onLower(person.memberId)}
                />
              ) : person.role === 'student' || person.role === 'guest' ? (
                <Button
                  kind="quiet"
                  label={sayings.remove}
                  hint={sayings.removeSpoken(person.name)}
                  hasPopup="dialog"
                  onPress={() => setRemoving(person)}
                />
              ) : null}
            </View>
          </View>
        ))}
      </View>
      <Dialog
        title={removing ? sayings.removeTitle(removing.name) : ''}
        isOpen={removing !== null}
        onClose={() => setRemoving(null)}
        actions={
          <>
            <Button label={words.common.cancel} onPress={() => setRemoving(null)} />
            <Button
              kind="danger"
              label={sayings.removeGo}
              onPress={() => {
                if (removing) onRemove(removing.memberId)
                setRemoving(null)
              }}
            />
          </>
        }
      >
        <Txt>{sayings.removeLead}</Txt>
      </Dialog>
    </View>
  )
}
