import { useEffect } from 'react';

const product = 'Slighthill';
let current = product;
let cover: string | null = null;

const show = (): void => {
  document.title = cover ?? current;
};

/** While the page is covered, its title says nothing about whom it shows. */
export const setCoverTitle = (title: string | null): void => {
  cover = title === null ? null : `${title} · ${product}`;
  show();
};

export const usePageTitle = (title: string | null): void => {
  useEffect(() => {
    current = title === null || title === '' ? product : `${title} · ${product}`;
    show();
  }, [title]);
};
