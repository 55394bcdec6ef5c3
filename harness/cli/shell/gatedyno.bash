# Completion of gatedyno in bash; the program itself says what may stand next.

_gatedyno() {
  local line current=${COMP_WORDS[COMP_CWORD]}
  [ "$current" = "=" ] && current=
  COMPREPLY=()
  while IFS= read -r line; do
    case $line in
      :files) mapfile -t -O "${#COMPREPLY[@]}" COMPREPLY < <(compgen -f -- "$current")
        compopt -o filenames 2>/dev/null ;;
      :folders) mapfile -t -O "${#COMPREPLY[@]}" COMPREPLY < <(compgen -d -- "$current")
        compopt -o filenames 2>/dev/null ;;
      *) COMPREPLY+=("$line") ;;
    esac
  done < <("${COMP_WORDS[0]}" complete "${COMP_WORDS[@]:0:COMP_CWORD+1}" 2>/dev/null)
}
complete -F _gatedyno gatedyno
