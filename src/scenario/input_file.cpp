#include "scenario/input_file.hpp"

#include <filesystem>
#include <utility>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/whole_file.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kLongestPath = 400;  // characters shown

/// A file name relative to the folder of the file that names it, as messages show it.
std::string path_beside(const std::string& naming, const std::string& file) {
    return (std::filesystem::path(naming).parent_path() / file).string();
}

}  // namespace

std::optional<InputFile> read_input_file(const Reading& reading, const Entry& entry,
                                         const std::string& example) {
    const std::string hint = "write a file name, such as '" + example + "'";
    auto name = read_text(reading, entry, hint);
    if (!name) return std::nullopt;
    if (name->empty()) {
        reading.error(entry.mark(), "the file name is empty", hint);
        return std::nullopt;
    }
    std::string path = path_beside(reading.name(), *name);
    std::string problem;
    auto text = read_whole_file(path, problem);
    if (!text) {
        reading.diagnostics().unreadable(
            reading.at(entry.mark()), "cannot read '" + cut(path, kLongestPath) + "': " + problem,
            "file names are relative to the " + std::string(reading.kind().noun) + "'s folder");
        return std::nullopt;
    }
    return InputFile{*std::move(name), std::move(path), *std::move(text)};
}

}  // namespace rainledger
