export const maxRows = 200_000
export const maxColumns = 500
export const maxCells = 5_000_000

export const tooManyRows = `The results table has more than ${maxRows.toLocaleString('en')} rows or ${maxCells.toLocaleString('en')} cells; please hand in only the rows of reported tests.`
