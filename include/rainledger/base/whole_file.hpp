#pragma once

#include <optional>
#include <string>
#include <string_view>

// Files that appear whole or not at all, and reading a file whole.
namespace rainledger {

/// The content of a file, or nothing with `problem` saying why ("no such file or directory").
/// A directory cannot be read, nor a file of more than 1 GiB.
[[nodiscard]] std::optional<std::string> read_whole_file(const std::string& path,
                                                         std::string& problem);

/// Writes all of `content` to an open descriptor: 0, or the errno of what stopped it.
[[nodiscard]] int write_all(int descriptor, std::string_view content);

/// An output file in the making. It is written beside its destination under a temporary name and
/// takes its own name only on commit; until then, and if it is never committed, the destination is
/// untouched. A destination that exists and is no regular file (a pipe, a device) is written
/// directly on commit.
class WholeFile {
public:
    /// Opens the temporary file; nothing with `problem` when the place cannot be written.
    [[nodiscard]] static std::optional<WholeFile> open(const std::string& path,
                                                       std::string& problem);

    WholeFile(WholeFile&& other) noexcept;
    WholeFile& operator=(WholeFile&& other) noexcept;
    WholeFile(const WholeFile&) = delete;
    WholeFile& operator=(const WholeFile&) = delete;
    ~WholeFile();  ///< removes the temporary file if it was not committed

    /// Writes `content` to the temporary file and to the disk. False with `problem` on failure
    /// (disk full, say); the destination stays as it was.
    [[nodiscard]] bool write(std::string_view content, std::string& problem);

    /// Gives the file its name. False with `problem` on failure.
    [[nodiscard]] bool commit(std::string& problem);

    [[nodiscard]] const std::string& path() const { return path_; }
    /// Where the content stands until commit, for clean-up after a signal; empty when there is
    /// none.
    [[nodiscard]] const std::string& temporary_path() const { return temporary_; }

private:
    WholeFile() = default;
    void discard() noexcept;

    std::string path_;       // as the user named it
    std::string target_;     // what it resolves to, through symbolic links
    std::string temporary_;  // empty when written directly or after commit
    int descriptor_ = -1;
};

}  // namespace rainledger
