/** What was wrong with a form as a whole, beside its button. */
export function FormFault({ children }: { children: string | null | undefined }) {
  if (!children) return null;
  return (
    <p role="alert" className="font-bold text-danger">
      {children}
    </p>
  );
}
