const WORDS = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine', 'Ten', 'Eleven', 'Twelve']

/** 'Five budgets', '13 budgets': a number as a title begins with it. */
export function counted(count: number, one: string, many: string): string {
  return `${WORDS[count] ?? count} ${count === 1 ? one : many}`
}
