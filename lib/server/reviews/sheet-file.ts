import 'server-only'
import { commentSheetCsv } from '@/lib/exchange/comment-sheet'
import type { CommentsView } from '@/lib/study/review-view'

/** The comment sheet of a revision as a file for spreadsheets. */
export const commentSheetFile = ({ comments }: CommentsView): string => commentSheetCsv(comments)
