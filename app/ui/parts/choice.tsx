// A drop-down drawn in the window's own hand.

export interface ChoiceProps<Value extends string> {
  readonly label: string;
  readonly value: Value;
  readonly options: readonly { readonly value: Value; readonly name: string }[];
  readonly onChoose: (value: Value) => void;
  readonly help?: string;
  readonly path?: string;
}

export function Choice<Value extends string>(props: ChoiceProps<Value>) {
  const { label, value, options, onChoose, help, path } = props;
  return (
    <span className="select">
      <select
        aria-label={label}
        title={help}
        data-path={path}
        value={value}
        onChange={(event) => {
          const found = options.find((option) => option.value === event.target.value);
          if (found) onChoose(found.value);
        }}
      >
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.name}
          </option>
        ))}
      </select>
      <svg width="9" height="6" aria-hidden="true">
        <path d="M0 0h9L4.5 6Z" fill="currentColor" />
      </svg>
    </span>
  );
}
