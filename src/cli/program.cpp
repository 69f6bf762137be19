#include "cli/program.hpp"

#include <array>
#include <string_view>

#include "cli/arguments.hpp"
#include "cli/fit_command.hpp"
#include "cli/fit_options.hpp"
#include "cli/help.hpp"
#include "cli/lookup_command.hpp"
#include "cli/lookup_options.hpp"
#include "cli/losses_command.hpp"
#include "cli/losses_options.hpp"
#include "cli/run_files.hpp"
#include "cli/storm_command.hpp"
#include "cli/storm_options.hpp"
#include "cli/terminal.hpp"
#include "rainledger/base/suggest.hpp"
#include "rainledger/report/version.hpp"
#include "rainledger/scenario/field_test_file.hpp"
#include "rainledger/scenario/scenario.hpp"

namespace rainledger {
namespace {

using Words = std::span<const std::string>;

constexpr std::array<std::string_view, 2> kSchemaWords{"scenario", "field_test"};

ExitStatus show(std::string_view text) {
    std::string problem;
    if (write_results(text, problem)) return ExitStatus::done;
    Messages(false).error("cannot write standard output: " + problem);
    return ExitStatus::file_trouble;
}

ExitStatus losses(Words words) {
    if (const HelpWanted page = help_wanted(words); page != HelpWanted::none)
        return show(losses_help(page));
    std::string problem;
    const auto options = read_losses_options(words, problem);
    if (!options) return wrong_usage("losses", problem);
    return run_losses(*options);
}

ExitStatus storm(Words words) {
    if (const HelpWanted page = help_wanted(words); page != HelpWanted::none)
        return show(storm_help(page));
    std::string problem;
    const auto options = read_storm_options(words, problem);
    if (!options) return wrong_usage("storm", problem);
    return run_storm(*options);
}

ExitStatus fit(Words words) {
    if (const HelpWanted page = help_wanted(words); page != HelpWanted::none)
        return show(fit_help(page));
    std::string problem;
    const auto options = read_fit_options(words, problem);
    if (!options) return wrong_usage("fit", problem);
    return run_fit(*options);
}

ExitStatus lookup(Words words) {
    if (const HelpWanted page = help_wanted(words); page != HelpWanted::none)
        return show(lookup_help(page));
    std::string problem;
    const auto options = read_lookup_options(words, problem);
    if (!options) return wrong_usage("lookup", problem);
    return run_lookup(*options);
}

/// The schema of a kind of file; nothing for a word that names none.
std::string schema_of(std::string_view file) {
    if (file == kSchemaWords[0]) return scenario_schema();
    if (file == kSchemaWords[1]) return field_test_schema();
    return {};
}

ExitStatus schema(Words words) {
    if (const HelpWanted page = help_wanted(words); page != HelpWanted::none)
        return show(schema_help(page));
    const Arguments arguments = sort_arguments(words, {});
    if (!arguments.problem.empty()) return wrong_usage("schema", arguments.problem);
    if (arguments.words.size() > 1)
        return wrong_usage(
            "schema", "one schema at a time; '" + arguments.words[1] + "' is one word too many");
    const std::string file =
        arguments.words.empty() ? std::string(kSchemaWords[0]) : arguments.words.front();
    const std::string text = schema_of(file);
    if (text.empty())
        return wrong_usage("schema",
                           "'" + file + "' is not known; " + suggestion(file, kSchemaWords));
    return show(text);
}

struct Command {
    std::string_view name;
    ExitStatus (*run)(Words);
};
constexpr std::array kCommands{Command{"losses", losses}, Command{"storm", storm},
                               Command{"fit", fit}, Command{"lookup", lookup},
                               Command{"schema", schema}};

ExitStatus no_command(Words words) {
    if (words.empty()) return wrong_usage("", "no command given");
    if (const HelpWanted page = help_wanted(words.first(1)); page != HelpWanted::none)
        return show(program_help(page));
    const std::string& first = words.front();
    if (first == "--version") return show("rainledger " + std::string(version()) + "\n");
    if (first.starts_with('-'))
        return wrong_usage(
            "", "unknown option '" + first + "'; options of a command stand after the command");
    std::vector<std::string_view> names;
    names.reserve(std::size(kCommands));
    for (const Command& command : kCommands)
        names.push_back(command.name);
    return wrong_usage("", "unknown command '" + first + "'; " + suggestion(first, names));
}

}  // namespace

ExitStatus run_program(Words words) {
    for (const Command& command : kCommands)
        if (!words.empty() && words.front() == command.name) return command.run(words.subspan(1));
    return no_command(words);
}

}  // namespace rainledger
