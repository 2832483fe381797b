import { keepPreviousData, queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import type { z } from 'zod'
import { AppError } from '../../../shared/api/errors.ts'
import { peopleEndpoints as peopleWire } from '../../../shared/api/people.ts'
import { type User, sessionEndpoints as sessionWire } from '../../../shared/api/session.ts'
import { call } from '../../lib/api.ts'

const keys = { who: ['who'], start: ['start'], people: ['people'], firm: ['firm'], outbox: ['outbox'], changes: ['changes'] } as const

/** Who is signed in; null when nobody. */
export function useWho() {
  return useQuery({
    queryKey: keys.who,
    queryFn: async ({ signal }): Promise<User | null> => {
      try {
        return (await call(sessionWire.who, { signal })).user
      } catch (error) {
        if (error instanceof AppError && error.code === 'not-signed-in') return null
        throw error
      }
    },
    staleTime: 60_000,
  })
}

export const startOptions = queryOptions({ queryKey: keys.start, queryFn: ({ signal }) => call(sessionWire.start, { signal }) })

/** Signs in and remembers who. */
export function useSignIn() {
  const client = useQueryClient()
  return async (body: { email: string; password: string }) => {
    const { user } = await call(sessionWire.signIn, { body })
    client.clear()
    client.setQueryData(keys.who, user)
    return user
  }
}

export function useMakeFirstLead() {
  const client = useQueryClient()
  return async (body: z.input<typeof sessionWire.makeFirstLead.body>) => {
    const { user } = await call(sessionWire.makeFirstLead, { body })
    client.clear()
    client.setQueryData(keys.who, user)
    return user
  }
}

export const signOut = () => call(sessionWire.signOut, {})
export const signOutEverywhere = () => call(sessionWire.signOutEverywhere, {})
export const askForLink = (body: { email: string }) => call(sessionWire.askForLink, { body })
export const setPassword = (body: { token: string; password: string }) => call(sessionWire.setPassword, { body })
export const changePassword = (body: { currentPassword: string; newPassword: string }) => call(sessionWire.changePassword, { body })

interface ListWanted {
  q: string
  sort: string
  cursor: string | undefined
}

export function usePeople(query: ListWanted) {
  return useQuery({
    queryKey: [...keys.people, query],
    queryFn: ({ signal }) => call(peopleWire.listPeople, { query: query, signal }),
    placeholderData: keepPreviousData,
  })
}

/** Changes to people; the list is asked for anew after each. */
export function usePeopleChanges() {
  const client = useQueryClient()
  const done = () => client.invalidateQueries({ queryKey: keys.people })
  const invite = async (body: z.input<typeof peopleWire.invite.body>) => {
    const person = await call(peopleWire.invite, { body })
    await done()
    return person
  }
  const change = useMutation({
    mutationFn: ({ personId, ...body }: { personId: string } & z.input<typeof peopleWire.changePerson.body>) =>
      call(peopleWire.changePerson, { params: { personId }, body }),
    onSettled: done,
  })
  const sendLink = useMutation({ mutationFn: (personId: string) => call(peopleWire.sendLink, { params: { personId } }) })
  return { invite, change, sendLink }
}

export function useFirm() {
  return useQuery({ queryKey: keys.firm, queryFn: ({ signal }) => call(peopleWire.readFirm, { signal }) })
}

export function useChangeFirm() {
  const client = useQueryClient()
  return async (body: z.input<typeof peopleWire.changeFirm.body>) => {
    const firm = await call(peopleWire.changeFirm, { body })
    client.setQueryData(keys.firm, firm)
    return firm
  }
}

export function useOutbox() {
  return useQuery({ queryKey: keys.outbox, queryFn: ({ signal }) => call(peopleWire.listOutbox, { query: { limit: 200 }, signal }) })
}

export function useCrew(enabled = true) {
  return useQuery({ queryKey: ['crew'], queryFn: ({ signal }) => call(peopleWire.listCrew, { signal }), enabled })
}

/** Who changed what of one subject, or of all. */
export function useChanges(subject: { subjectKind?: string; subjectId?: string }, enabled = true) {
  return useQuery({
    queryKey: [...keys.changes, subject],
    queryFn: ({ signal }) => call(peopleWire.listChanges, { query: { ...subject, limit: 100 }, signal }),
    enabled,
  })
}
