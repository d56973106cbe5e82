'use client';

import { createContext, useContext } from 'react';

import type { FormState } from './form-state';

type FormContextValue = { state: FormState; pending: boolean };

export const FormContext = createContext<FormContextValue>({ state: null, pending: false });

export const useFormState = () => useContext(FormContext);
