# Completion of gatedyno in fish; the program itself says what may stand next.

function __gatedyno_offers
    set -l words (commandline -opc) (commandline -ct)
    for line in ($words[1] complete $words 2>/dev/null)
        switch $line
            case :files
                __fish_complete_path (commandline -ct)
            case :folders
                __fish_complete_directories (commandline -ct)
            case '*'
                echo $line
        end
    end
end
complete -c gatedyno -f -a '(__gatedyno_offers)'
