'use client';

import { Eye, EyeOff } from 'lucide-react';
import { useState, type ComponentProps } from 'react';
import { buttonLook } from './button-look';
import { TextInput } from './text-input';

/** A password that can be shown while typing it. */
export function PasswordInput(props: Omit<ComponentProps<'input'>, 'type'>) {
  const [shown, setShown] = useState(false);
  return (
    <span className="relative block">
      <TextInput
        {...props}
        type={shown ? 'text' : 'password'}
        className="pr-11"
        autoCapitalize="none"
        spellCheck={false}
      />
      <button
        type="button"
        aria-label={shown ? 'Hide the password' : 'Show the password'}
        onClick={() => setShown(!shown)}
        className={buttonLook('quiet', 'icon', 'absolute inset-y-0 right-0.5 my-auto')}
      >
        {shown ? <EyeOff aria-hidden className="size-4" /> : <Eye aria-hidden className="size-4" />}
      </button>
    </span>
  );
}
