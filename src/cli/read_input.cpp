#include "cli/read_input.hpp"

#include <algorithm>
#include <cstddef>
#include <filesystem>

#include "rainledger/base/whole_file.hpp"

namespace rainledger {

std::optional<std::string> read_file(const std::string& path, Diagnostics& diagnostics) {
    std::string problem;
    auto text = read_whole_file(path, problem);
    if (!text) diagnostics.unreadable({path, 0, 0, {}}, "cannot read the file: " + problem);
    return text;
}

bool has_yaml_ending(const std::string& path) {
    std::string ending = std::filesystem::path(path).extension().string();
    std::ranges::transform(ending, ending.begin(), lower);
    return ending == ".yaml" || ending == ".yml";
}

std::string_view first_line(std::string_view text) {
    constexpr std::string_view kBlanks = " \t\r";
    while (!text.empty()) {
        const std::size_t end = std::min(text.find('\n'), text.size());
        const std::string_view line = text.substr(0, end);
        const std::size_t at = line.find_first_not_of(kBlanks);
        if (at != std::string_view::npos && line[at] != '#') return line.substr(at);
        text.remove_prefix(std::min(end + 1, text.size()));
    }
    return {};
}

bool begins_as_yaml(std::string_view text) {
    const std::string_view line = first_line(text);
    if (line.starts_with("---") || line.starts_with("{") || line.starts_with("%YAML")) return true;
    const std::size_t colon = line.find(':');
    if (colon == std::string_view::npos || colon == 0) return false;
    const bool ends_key = colon + 1 == line.size() || line[colon + 1] == ' ' ||
                          line[colon + 1] == '\r' || line[colon + 1] == '\t';
    return ends_key && line.substr(0, colon).find_first_of(",;\t \"") == std::string_view::npos;
}

}  // namespace rainledger
