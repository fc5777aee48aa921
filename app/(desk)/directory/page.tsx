import { redirect } from 'next/navigation'

export default function DirectoryPage() {
  redirect('/directory/venues')
}
