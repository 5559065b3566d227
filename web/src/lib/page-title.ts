import { useEffect, useState } from 'react';

const product = 'Slighthill';
const titles = new Map<number, string>();
let nextOrder = 0;
let cover: string | null = null;

/** The innermost page's title: pages are numbered as they first render, and an outer page renders first. */
const show = (): void => {
  const innermost = titles.get(Math.max(...titles.keys()));
  const words = cover ?? innermost;
  document.title = words ? `${words} · ${product}` : product;
};

/** While the page is covered, its title says nothing about whom it shows. */
export const setCoverTitle = (title: string | null): void => {
  cover = title;
  show();
};

/** A drawer's title stands over its page's while the drawer is open. */
export const usePageTitle = (title: string | null): void => {
  const [order] = useState(() => nextOrder++);
  useEffect(() => {
    titles.set(order, title ?? '');
    show();
    return () => {
      titles.delete(order);
      show();
    };
  }, [order, title]);
};
