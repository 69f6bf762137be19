#pragma once

#include <string>
#include <utility>
#include <vector>

#include <sys/types.h>

// Runs the built program as a user would and takes down what it said.
namespace rainledger::cli_test {

/// A fresh folder, removed with all that is in it.
class Folder {
public:
    Folder();
    Folder(const Folder&) = delete;
    Folder& operator=(const Folder&) = delete;
    ~Folder();

    [[nodiscard]] const std::string& path() const { return path_; }
    [[nodiscard]] std::string path(const std::string& name) const { return path_ + "/" + name; }
    void write(const std::string& name, const std::string& text) const;
    [[nodiscard]] std::string read(const std::string& name) const;
    /// Names of what lies in it, sorted.
    [[nodiscard]] std::vector<std::string> names() const;

private:
    std::string path_;
};

/// Where standard output goes.
enum class Out {
    captured,
    full_disk,    ///< /dev/full
    closed_pipe,  ///< a pipe without a reader
    closed,       ///< no descriptor at all
};

struct Setting {
    std::string folder;  ///< the working directory
    Out out = Out::captured;
    bool errors_on_terminal = false;  ///< standard error is a pseudo-terminal
    std::vector<std::pair<std::string, std::string>> environment = {};
};

struct Outcome {
    int status = -1;  ///< exit status; 1000 + signal when killed by one
    std::string out;
    std::string err;
};

/// Runs the program with `words` after its name.
[[nodiscard]] Outcome run(const Setting& setting, const std::vector<std::string>& words);

/// Starts the program, waits until a file whose name holds `sign` appears in the working directory
/// (for at most ten seconds), sends `signal`, and waits for the end.
[[nodiscard]] Outcome run_and_signal(const Setting& setting, const std::vector<std::string>& words,
                                     const std::string& sign, int signal);

}  // namespace rainledger::cli_test
