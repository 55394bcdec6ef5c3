#include "harness/cli/completion.h"

#include <algorithm>
#include <cstddef>
#include <string_view>
#include <utility>

#include "harness/cli/value_kind.h"

namespace gatedyno {
namespace {

using Words = std::vector<std::string>;

// Without the "=" that stand alone, and "--node=p4" as two words.
Words Split(const Words& words) {
  Words split;
  for (size_t i = 0; i < words.size(); ++i) {
    const std::string& word = words[i];
    const size_t equals = word.find('=');
    if (word == "=") {
      if (i + 1 == words.size()) {
        split.emplace_back();
      }
    } else if (word.starts_with("--") && equals != std::string::npos) {
      split.push_back(word.substr(0, equals));
      split.push_back(word.substr(equals + 1));
    } else {
      split.push_back(word);
    }
  }
  return split;
}

bool IsOption(const std::string& word) {
  return word.starts_with("-");
}

bool TakesValue(const CLI::Option& option) {
  return option.get_items_expected_max() > 0;
}

const CLI::Option* FindOption(const CLI::App& app, const std::string& name) {
  for (const CLI::Option* option : app.get_options()) {
    if (!option->get_positional() && option->check_name(name)) {
      return option;
    }
  }
  return nullptr;
}

// "matched" and "self" of the type "TEXT:{matched,self}".
Words Choices(std::string_view type) {
  Words choices;
  const size_t open = type.find('{');
  const size_t close = type.rfind('}');
  if (open == std::string_view::npos || close == std::string_view::npos) {
    return choices;
  }
  std::string_view list = type.substr(open + 1, close - open - 1);
  while (true) {
    const size_t comma = list.find(',');
    choices.emplace_back(list.substr(0, comma));
    if (comma == std::string_view::npos) {
      return choices;
    }
    list.remove_prefix(comma + 1);
  }
}

Completion ValuesOf(const CLI::Option& option, const KnownNames& names) {
  const std::string type = option.get_type_name();
  const std::pair<const char*, Completion> kinds[] = {
      {kFile, {.words = {}, .files = true}},
      {kFolder, {.words = {}, .folders = true}},
      {kNode, {.words = names.nodes, .files = true}},
      {kCorner, {.words = names.corners}},
      {kCell, {.words = names.cells, .files = true}},
      {kPlanOrCell, {.words = names.cells, .files = true}}};
  for (const auto& [kind, values] : kinds) {
    if (type == kind) {
      return values;
    }
  }
  return {.words = Choices(type)};
}

Completion Commands(const CLI::App& program) {
  Completion commands;
  for (const CLI::App* command : program.get_subcommands({})) {
    if (!command->get_group().empty()) {
      commands.words.push_back(command->get_name());
    }
  }
  return commands;
}

const CLI::App* FindCommand(const CLI::App& program, const std::string& name) {
  for (const CLI::App* command : program.get_subcommands({})) {
    if (command->get_name() == name) {
      return command;
    }
  }
  return nullptr;
}

Completion Options(const CLI::App& app) {
  Completion options;
  for (const CLI::Option* option : app.get_options()) {
    for (const std::string& name : option->get_lnames()) {
      options.words.push_back("--" + name);
    }
  }
  return options;
}

// The positional in whose place word number `place` would be.
const CLI::Option* PositionalAt(const CLI::App& app, int place) {
  for (const CLI::Option* option : app.get_options()) {
    if (option->get_positional()) {
      if (place < option->get_items_expected_max()) {
        return option;
      }
      place -= option->get_items_expected_max();
    }
  }
  return nullptr;
}

// `before` are the words after the command, but for the one being typed.
Completion AfterCommand(const CLI::App& command,
                        const Words& before,
                        const std::string& current,
                        const KnownNames& names) {
  int positionals = 0;
  const CLI::Option* open = nullptr;  // Waits for its value.
  for (const std::string& word : before) {
    if (open != nullptr) {
      open = nullptr;
    } else if (IsOption(word)) {
      const CLI::Option* option = FindOption(command, word);
      open = option != nullptr && TakesValue(*option) ? option : nullptr;
    } else {
      ++positionals;
    }
  }
  if (open != nullptr) {
    return ValuesOf(*open, names);
  }
  if (IsOption(current)) {
    return Options(command);
  }
  const CLI::Option* positional = PositionalAt(command, positionals);
  return positional == nullptr ? Completion() : ValuesOf(*positional, names);
}

}  // namespace

Completion Complete(const CLI::App& program,
                    const Words& words,
                    const KnownNames& names) {
  Words before = Split(words);
  std::string current;
  if (!before.empty()) {
    current = before.back();
    before.pop_back();
  }
  Completion completion;
  if (before.empty()) {
    completion = IsOption(current) ? Options(program) : Commands(program);
  } else if (const CLI::App* command = FindCommand(program, before.front())) {
    before.erase(before.begin());
    completion = AfterCommand(*command, before, current, names);
  }
  std::erase_if(completion.words, [&current](const std::string& word) {
    return !word.starts_with(current);
  });
  return completion;
}

std::string CompletionText(const Completion& completion) {
  std::string text;
  for (const std::string& word : completion.words) {
    text += word + '\n';
  }
  text += completion.files ? ":files\n" : "";
  text += completion.folders ? ":folders\n" : "";
  return text;
}

}  // namespace gatedyno
