#include "harness/cli/manual.h"

#include <string_view>
#include <vector>

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "harness/report/run_table.h"

namespace gatedyno {
namespace {

// What is no markup of ours: backslashes, hyphens that a reader may copy, and a
// first character that would be a request.
std::string Roff(std::string_view text) {
  std::string out;
  for (const char c : text) {
    switch (c) {
      case '\\':
        out += "\\e";
        break;
      case '-':
        out += "\\-";
        break;
      default:
        out += c;
    }
  }
  return out.starts_with(".") || out.starts_with("'") ? "\\&" + out : out;
}

std::string Bold(std::string_view text) {
  return "\\fB" + Roff(text) + "\\fR";
}

std::string Italic(std::string_view text) {
  return "\\fI" + Roff(text) + "\\fR";
}

// "FILE" for a value of the kind FILE, "matched|self" for a choice.
std::string ValueText(const CLI::Option& option) {
  if (option.get_items_expected_max() == 0) {
    return "";
  }
  std::string type = option.get_type_name();
  const size_t open = type.find('{');
  const size_t close = type.rfind('}');
  if (open != std::string::npos && close != std::string::npos) {
    std::vector<std::string> choices;
    for (const std::string& choice :
         CLI::detail::split(type.substr(open + 1, close - open - 1), ',')) {
      choices.push_back(Bold(choice));
    }
    return fmt::format(" {}", fmt::join(choices, "|"));
  }
  return " " + Italic(type.substr(0, type.find(':')));
}

// "-o, --page FILE".
std::string NamesText(const CLI::Option& option) {
  std::vector<std::string> names;
  for (const std::string& name : option.get_snames()) {
    names.push_back(Bold("-" + name));
  }
  for (const std::string& name : option.get_lnames()) {
    names.push_back(Bold("--" + name));
  }
  return fmt::format("{}{}", fmt::join(names, ", "), ValueText(option));
}

std::string OptionText(const CLI::Option& option) {
  return fmt::format(
      ".TP\n{}\n{}\n", NamesText(option), Roff(option.get_description()));
}

std::string PositionalText(const CLI::Option& option) {
  return fmt::format(".TP\n{}\n{}\n",
                     Italic(option.get_name(true)),
                     Roff(option.get_description()));
}

std::string PositionalSynopsis(const CLI::Option& option) {
  std::string text = Italic(option.get_name(true));
  if (option.get_items_expected_max() > 1) {
    text += " ...";
  }
  return option.get_required() ? text : "[" + text + "]";
}

// ".B gatedyno run plan-or-cells ... [option ...]" and what follows it.
std::string CommandText(const CLI::App& command) {
  std::string synopsis = Bold("gatedyno " + command.get_name());
  std::string positionals;
  std::string required;
  std::string options;
  for (const CLI::Option* option : command.get_options()) {
    if (option->get_positional()) {
      synopsis += ' ' + PositionalSynopsis(*option);
      positionals += PositionalText(*option);
    } else if (option != command.get_help_ptr()) {
      required += option->get_required() ? ' ' + NamesText(*option) : "";
      options += OptionText(*option);
    }
  }
  // A footer of its own, not the program's.
  const std::string footer =
      command.get_footer() == command.get_parent()->get_footer()
          ? ""
          : fmt::format(".PP\n{}\n", Roff(command.get_footer()));
  return fmt::format(".SS {}\n{}{}{}\n.PP\n{}.\n{}{}{}",
                     Roff(command.get_name()),
                     synopsis,
                     required,
                     options.empty() ? "" : " [" + Italic("option") + " ...]",
                     Roff(command.get_description()),
                     positionals,
                     options,
                     footer);
}

std::vector<const CLI::App*> ShownCommands(const CLI::App& program) {
  return program.get_subcommands(
      [](const CLI::App* command) { return !command->get_group().empty(); });
}

constexpr std::string_view kDescription =
    "gatedyno reads a cell's transistor netlist, derives logical effort g and "
    "parasitic delay p of each input and edge from its topology, measures both "
    "with an embedded circuit simulator in fanout\\-of\\-N decks, and says "
    "where the measured numbers differ from the hand numbers by more than is "
    "allowed and their uncertainty together.\n";

constexpr std::string_view kExamples =
    ".TP\nHand numbers of a cell, without simulation\n"
    "\\fBgatedyno estimate mycell.sp \\-\\-node p65\\fR\n"
    ".TP\nThe same against simulation, at every corner\n"
    "\\fBgatedyno run mycell.sp \\-\\-node p65 \\-\\-corner \\(aq*\\(aq\\fR\n"
    ".TP\nA plan overnight, and its report\n"
    "\\fBgatedyno run plan.json \\-\\-store library.db\\fR\n"
    ".br\n\\fBgatedyno report library.db \\-o library.html\\fR\n";

}  // namespace

std::string ManualPage(const CLI::App& program, const std::string& version) {
  std::string text = fmt::format(
      ".TH GATEDYNO 1 \"\" \"gatedyno {}\" \"User commands\"\n"
      ".SH NAME\ngatedyno \\- check hand effort estimates of static CMOS cells "
      "against circuit simulation\n"
      ".SH SYNOPSIS\n{} {} [{} ...]\n.br\n{} {}\n"
      ".SH DESCRIPTION\n{}.SH COMMANDS\n",
      version,
      Bold("gatedyno"),
      Italic("command"),
      Italic("argument"),
      Bold("gatedyno"),
      Bold("--version"),
      kDescription);
  for (const CLI::App* command : ShownCommands(program)) {
    text += CommandText(*command);
  }
  text += fmt::format(".SH EXIT STATUS\n{}\n.SH EXAMPLES\n{}.SH CAUTION\n{}\n",
                      Roff(program.get_footer()),
                      kExamples,
                      Roff(kCaution));
  return text;
}

}  // namespace gatedyno
