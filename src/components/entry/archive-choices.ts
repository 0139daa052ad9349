/** Which of the people, clients or mills are listed. */
export const ARCHIVE_CHOICES = [
  { value: 'active', label: 'Active' },
  { value: 'archived', label: 'Archived' },
  { value: 'all', label: 'All' },
] as const
