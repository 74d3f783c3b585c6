/** 'R> pvalue(test)', '>>> x.pvalue', 'In [3]: …', '> p.adjust(p)', '> fit <- lm(y ~ x)', '. oneway y group' is none: prose has such lines. */
const PROMPT = /^(?:R>|>>>|In \[\d+\]:)\s*\S|^>\s+[A-Za-z.][\w.$]*\s*(?:<-|\(|\$|\[|::)/

/** '+ data = d)': a command that goes on. */
const CONTINUED = /^\+\s+\S/

/** Whether a line is what was typed at the prompt of a statistics program. */
export function isPrompt(text: string): boolean {
  return PROMPT.test(text)
}

/** Whether a line goes on with the command before it: by its sign, or because a bracket is still open. */
export function continuesCommand(command: readonly string[], text: string): boolean {
  if (command.length === 0 || isPrompt(text)) return false
  if (CONTINUED.test(text)) return true
  const typed = command.join(' ').replace(/"[^"]*"|'[^']*'/g, '')
  const open = (typed.match(/[([{]/g) ?? []).length - (typed.match(/[)\]}]/g) ?? []).length
  return open > 0 && command.length < 12
}
