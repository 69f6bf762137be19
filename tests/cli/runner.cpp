#include "cli/runner.hpp"

#include <algorithm>
#include <array>
#include <chrono>
#include <filesystem>
#include <stdexcept>
#include <thread>

#include <fcntl.h>
#include <signal.h>
#include <stdlib.h>
#include <sys/wait.h>
#include <unistd.h>

namespace rainledger::cli_test {
namespace {

constexpr unsigned kMostSeconds = 120;  // then the program counts as hanging and is killed

void require(bool fine, const char* what) {
    if (!fine) throw std::runtime_error(what);
}

/// The descriptors that the child gets, and where to read what it wrote.
struct Streams {
    Folder folder;  // outside the working directory
    int out = -1;
    int err = -1;
    int terminal = -1;  // the reading end, when standard error is a terminal

    explicit Streams(const Setting& setting);
    Streams(const Streams&) = delete;
    Streams& operator=(const Streams&) = delete;
    ~Streams();
    [[nodiscard]] std::string errors() const;
};

int open_for_writing(const std::string& path) {
    const int descriptor = ::open(path.c_str(), O_WRONLY | O_CREAT | O_CLOEXEC, 0600);
    require(descriptor >= 0, "cannot open a stream");
    return descriptor;
}

int pipe_without_reader() {
    std::array<int, 2> ends{};
    require(::pipe2(ends.data(), O_CLOEXEC) == 0, "cannot make a pipe");
    ::close(ends[0]);
    return ends[1];
}

Streams::Streams(const Setting& setting) {
    if (setting.out == Out::captured) out = open_for_writing(folder.path("out"));
    if (setting.out == Out::full_disk) out = open_for_writing("/dev/full");
    if (setting.out == Out::closed_pipe) out = pipe_without_reader();
    if (!setting.errors_on_terminal) {
        err = open_for_writing(folder.path("err"));
        return;
    }
    terminal = ::posix_openpt(O_RDWR | O_NOCTTY | O_CLOEXEC);
    require(terminal >= 0 && ::grantpt(terminal) == 0 && ::unlockpt(terminal) == 0,
            "cannot make a terminal");
    err = ::open(::ptsname(terminal), O_RDWR | O_NOCTTY | O_CLOEXEC);
    require(err >= 0, "cannot open the terminal");
}

Streams::~Streams() {
    for (const int descriptor : {out, err, terminal})
        if (descriptor >= 0) ::close(descriptor);
}

std::string Streams::errors() const {
    if (terminal < 0) return folder.read("err");
    std::string text;
    std::array<char, 4096> buffer{};
    ::fcntl(terminal, F_SETFL, O_NONBLOCK);
    ssize_t got = 0;
    while ((got = ::read(terminal, buffer.data(), buffer.size())) > 0)
        text.append(buffer.data(), static_cast<std::size_t>(got));
    return text;
}

void set_environment(const Setting& setting) {
    ::unsetenv("NO_COLOR");
    ::setenv("TERM", "xterm", 1);
    for (const auto& [name, value] : setting.environment)
        ::setenv(name.c_str(), value.c_str(), 1);
}

[[noreturn]] void become_program(const Setting& setting, const Streams& streams,
                                 const std::vector<std::string>& words) {
    std::vector<std::string> all{"rainledger"};
    all.insert(all.end(), words.begin(), words.end());
    std::vector<char*> arguments;
    for (std::string& word : all)
        arguments.push_back(word.data());
    arguments.push_back(nullptr);
    set_environment(setting);
    ::dup2(streams.err, STDERR_FILENO);
    if (setting.out == Out::closed)
        ::close(STDOUT_FILENO);
    else
        ::dup2(streams.out, STDOUT_FILENO);
    ::alarm(kMostSeconds);
    if (::chdir(setting.folder.c_str()) == 0) ::execv(RAINLEDGER_PROGRAM, arguments.data());
    ::_exit(126);
}

pid_t start(const Setting& setting, const Streams& streams, const std::vector<std::string>& words) {
    const pid_t child = ::fork();
    require(child >= 0, "cannot fork");
    if (child == 0) become_program(setting, streams, words);
    return child;
}

Outcome finish(const Setting& setting, const Streams& streams, pid_t child) {
    int state = 0;
    require(::waitpid(child, &state, 0) == child, "cannot wait");
    Outcome outcome;
    outcome.status = WIFEXITED(state) ? WEXITSTATUS(state) : 1000 + WTERMSIG(state);
    if (setting.out == Out::captured) outcome.out = streams.folder.read("out");
    outcome.err = streams.errors();
    return outcome;
}

bool has_sign(const std::string& folder, const std::string& sign) {
    const std::filesystem::directory_iterator entries(folder);
    return std::any_of(begin(entries), end(entries), [&](const auto& entry) {
        return entry.path().filename().string().find(sign) != std::string::npos;
    });
}

}  // namespace

Outcome run(const Setting& setting, const std::vector<std::string>& words) {
    const Streams streams(setting);
    return finish(setting, streams, start(setting, streams, words));
}

Outcome run_and_signal(const Setting& setting, const std::vector<std::string>& words,
                       const std::string& sign, int signal) {
    using namespace std::chrono_literals;
    const Streams streams(setting);
    const pid_t child = start(setting, streams, words);
    for (int i = 0; i < 1000 && !has_sign(setting.folder, sign); ++i)
        std::this_thread::sleep_for(10ms);
    std::this_thread::sleep_for(50ms);  // the file is remembered just after it appears
    ::kill(child, signal);
    return finish(setting, streams, child);
}

}  // namespace rainledger::cli_test
