@echo off
rem The headless program: plain Java over the program's own modules, without any jar of the window platform.
setlocal enabledelayedexpansion
set "home=%~dp0.."
set "java=java"
if defined JAVA_HOME set "java=%JAVA_HOME%\bin\java"
set "list=%TEMP%\fringekeep-headless-%RANDOM%.txt"
set "path_="
for /f "delims=" %%j in ('dir /s /b "%home%\fringekeep\modules\*.jar" ^| findstr /v /i "fringekeep-desk.jar fringekeep.desk"') do set "path_=!path_!;%%j"
> "%list%" echo -cp "!path_:~1!"
"%java%" -XX:+UseSerialGC -Djava.awt.headless=true @"%list%" fringekeep.commandline.Main %*
set code=%errorlevel%
del "%list%" 2>nul
exit /b %code%
