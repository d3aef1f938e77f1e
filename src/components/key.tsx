import type { ButtonHTMLAttributes, ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Icon, type IconName } from '#src/components/icons.tsx';
import { type KeyKind, keyLook } from '#src/components/key-look.ts';

interface KeyProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  /** 'plain' unless told; a screen has one 'main'. */
  kind?: KeyKind;
  icon?: IconName;
  /** The screen's one great key: 76 px high and larger in type. */
  isGreat?: boolean;
}

/** A button, 56 px high at least. It submits no form unless `type="submit"`. */
export function Key({
  kind = 'plain',
  icon,
  isGreat = false,
  className = '',
  type = 'button',
  children,
  ...rest
}: KeyProps) {
  return (
    <button type={type} className={`${keyLook(kind, isGreat ? 'great' : 'plain')} ${className}`} {...rest}>
      {icon && <Icon name={icon} size={isGreat ? 32 : 24} />}
      {children}
    </button>
  );
}

interface KeyLinkProps {
  to: string;
  kind?: KeyKind;
  icon?: IconName;
  className?: string;
  children: ReactNode;
}

/** A link that looks and measures as a key does. */
export function KeyLink({ to, kind = 'plain', icon, className = '', children }: KeyLinkProps) {
  return (
    <Link to={to} className={`${keyLook(kind)} ${className}`}>
      {icon && <Icon name={icon} />}
      {children}
    </Link>
  );
}

interface IconKeyProps extends Omit<ButtonHTMLAttributes<HTMLButtonElement>, 'children'> {
  icon: IconName;
  /** The word under the icon; the accessible name where `isBare`. */
  word: string;
  kind?: KeyKind;
  /** Without the word in sight: for 'close' and 'back' alone, whose signs need none. */
  isBare?: boolean;
}

/** A key with an icon above its word. */
export function IconKey({
  icon,
  word,
  kind = 'plain',
  isBare = false,
  className = '',
  type = 'button',
  ...rest
}: IconKeyProps) {
  return (
    <button
      type={type}
      className={`${keyLook(kind, isBare ? 'bare' : 'stacked')} ${className}`}
      {...(isBare ? { 'aria-label': word } : {})}
      {...rest}
    >
      <Icon name={icon} />
      {!isBare && <span>{word}</span>}
    </button>
  );
}
