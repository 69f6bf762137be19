#include "cli/arguments.hpp"

#include <algorithm>

#include <boost/program_options.hpp>

#include "rainledger/base/suggest.hpp"

namespace rainledger {
namespace {

namespace po = boost::program_options;

constexpr const char* kWords = "words";

/// Every value is taken as text, one word of it; the description owns what new makes.
po::options_description described(std::span<const OptionRow> known) {
    po::options_description out;
    for (const OptionRow& row : known)
        out.add_options()(std::string(row.name).c_str(),
                          new po::untyped_value(row.argument.empty()));
    out.add_options()(kWords, new po::untyped_value());
    return out;
}

std::string_view argument_of(std::string_view name, std::span<const OptionRow> known) {
    for (const OptionRow& row : known)
        if (row.name == name) return row.argument;
    return {};
}

std::string without_dashes(std::string_view option) {
    option.remove_prefix(std::min(option.find_first_not_of('-'), option.size()));
    return std::string(option.substr(0, option.find('=')));
}

/// The words as the library splits them; every value is still text.
std::vector<po::option> split(std::span<const std::string> given,
                              std::span<const OptionRow> known) {
    const po::options_description description = described(known);
    po::positional_options_description words;
    words.add(kWords, -1);
    const int style = po::command_line_style::unix_style & ~po::command_line_style::allow_guessing;
    return po::command_line_parser(std::vector<std::string>(given.begin(), given.end()))
        .options(description)
        .positional(words)
        .style(style)
        .run()
        .options;
}

/// True where the word taken as the argument is the next option: "--json --quiet".
bool took_an_option(const po::option& option) {
    return option.original_tokens.size() > 1 && option.value.front().starts_with("--");
}

void sort_option(Arguments& sorted, const po::option& option, std::span<const OptionRow> known) {
    const std::string& name = option.string_key;
    const std::string text = option.value.empty() ? std::string() : option.value.front();
    if (name == kWords)
        sorted.words.push_back(text);
    else if (sorted.has(name))
        sorted.problem = "--" + name + " is given twice";
    else if (!argument_of(name, known).empty() && (text.empty() || took_an_option(option)))
        sorted.problem = "--" + name + " needs a value: " + std::string(argument_of(name, known));
    else
        sorted.options.emplace(name, text);
}

std::string syntax_problem(const po::invalid_command_line_syntax& error,
                           std::span<const OptionRow> known) {
    const std::string name = without_dashes(error.get_option_name());
    if (error.kind() == po::invalid_command_line_syntax::extra_parameter)
        return "--" + name + " takes no argument";
    return "--" + name + " needs a value: " + std::string(argument_of(name, known));
}

}  // namespace

const std::string* Arguments::find(std::string_view name) const {
    const auto found = options.find(name);
    return found == options.end() ? nullptr : &found->second;
}

std::string option_suggestion(std::string_view typed, std::span<const OptionRow> known) {
    std::vector<std::string_view> names{"help"};
    for (const OptionRow& row : known)
        names.push_back(row.name);
    const std::string bare = without_dashes(typed);
    if (const auto name = nearest(bare, names))
        return "; did you mean '--" + std::string(*name) + "'?";
    return {};
}

Arguments sort_arguments(std::span<const std::string> given, std::span<const OptionRow> known) {
    Arguments sorted;
    try {
        for (const po::option& option : split(given, known)) {
            sort_option(sorted, option, known);
            if (!sorted.problem.empty()) break;
        }
    } catch (const po::unknown_option& error) {
        const std::string name = error.get_option_name();
        sorted.problem = "unknown option '" + name + "'" + option_suggestion(name, known);
    } catch (const po::invalid_command_line_syntax& error) {
        sorted.problem = syntax_problem(error, known);
    } catch (const po::error& error) {
        sorted.problem = error.what();
    }
    return sorted;
}

HelpWanted help_wanted(std::span<const std::string> given) {
    for (const std::string& word : given) {
        if (word == "--") break;
        if (word == "--help") return HelpWanted::long_page;
        if (word == "-h") return HelpWanted::short_page;
    }
    return HelpWanted::none;
}

}  // namespace rainledger
