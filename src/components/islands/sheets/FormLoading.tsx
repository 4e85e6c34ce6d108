/** While a form is being fetched; on a slow line it says so. */
export const FormLoading = () => (
  <p className="muted" role="status">
    The form is on its way.
  </p>
);
