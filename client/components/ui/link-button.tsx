import { Link, type LinkProps } from 'react-router-dom'
import { buttonClasses, type ButtonVariant } from '#client/components/ui/button.tsx'

export interface LinkButtonProps extends LinkProps {
  variant?: ButtonVariant
}

/** A link that looks like a button: it goes somewhere, a button does something. */
export function LinkButton({ variant = 'plain', className, ...rest }: LinkButtonProps) {
  return <Link {...rest} className={buttonClasses(variant, className)} />
}
