import type { ReactNode } from 'react';

/** A group of a page: an ink rule and a heading, what it is about, acts at the end. */
export function SectionHead({
  title,
  about,
  acts,
  id,
}: {
  title: ReactNode;
  about?: ReactNode;
  acts?: ReactNode;
  id?: string;
}) {
  return (
    <div className="section-head" id={id}>
      <h2>{title}</h2>
      {about ? <small>{about}</small> : null}
      {acts ? <div className="section-acts">{acts}</div> : null}
    </div>
  );
}
